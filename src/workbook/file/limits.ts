/** Bounds that a workbook of this trade never meets; a hostile file does, and is refused before it can do harm. */
export interface Limits {
  readonly fileBytes: number;
  readonly unzippedBytes: number;
  readonly parts: number;
  readonly cells: number;
  readonly depth: number;
}

const MEGABYTE = 1024 * 1024;

export const LIMITS: Limits = { fileBytes: 100 * MEGABYTE, unzippedBytes: 400 * MEGABYTE, parts: 10_000, cells: 2_000_000, depth: 64 };

export const MOST_ROWS = 1_048_576, MOST_COLUMNS = 16_384;
