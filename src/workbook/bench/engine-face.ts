/**
 * What the bench's port uses of the engine's public face, written out, because parts of it are typed only by plugins
 * that add themselves at run time.
 */
export interface EngineRange { readonly startRow: number; readonly endRow: number; readonly startColumn: number; readonly endColumn: number }

export interface FaceNote { readonly id: string; readonly row: number; readonly col: number; readonly width: number; readonly height: number; readonly note: string; readonly show?: boolean }

export interface FaceRule {
  readonly cfId: string;
  readonly ranges: readonly EngineRange[];
  readonly stopIfTrue: boolean;
  readonly rule: { readonly type: string; readonly subType?: string; readonly value?: unknown; readonly style?: unknown };
}

export interface FaceRange {
  getRange(): EngineRange;
  getNumberFormats(): string[][];
  getDisplayValues(): string[][];
  getNote(): FaceNote | null | undefined;
  createOrUpdateNote(note: FaceNote): unknown;
  deleteNote(): unknown;
  activate(): unknown;
}

export interface FaceWorksheet {
  getSheetId(): string;
  getSheetName(): string;
  isSheetHidden(): boolean;
  getRange(row: number, column: number, rows?: number, columns?: number): FaceRange;
  getMaxRows(): number;
  getMaxColumns(): number;
  getMergedRanges(): FaceRange[];
  getNotes(): FaceNote[];
  getConditionalFormattingRules(): FaceRule[];
  addConditionalFormattingRule(rule: FaceRule): unknown;
  deleteConditionalFormattingRule(id: string): unknown;
  scrollToCell(row: number, column: number): unknown;
  /** what the window shows of the sheet */
  getVisibleRange(): EngineRange | null;
  getSheet(): {
    getCellRaw(row: number, column: number): unknown;
    getCellMatrix(): { forValue(each: (row: number, column: number, cell: unknown) => void): void };
  };
}

export interface FaceWorkbook {
  getId(): string;
  getSheets(): FaceWorksheet[];
  getSheetByName(name: string): FaceWorksheet | null;
  getActiveSheet(): FaceWorksheet;
  setActiveSheet(sheet: FaceWorksheet): unknown;
  getActiveRange(): FaceRange | null;
  onSelectionChange(hear: (ranges: EngineRange[]) => void): { dispose(): void };
  undo(): unknown;
  redo(): unknown;
}

/** One workbook open in the page, with what the port needs beside it. It is replaced when another file is opened. */
export interface OpenWorkbook {
  readonly workbook: FaceWorkbook;
  readonly protectedSheets: ReadonlySet<string>;
  readonly tables: readonly { readonly sheet: string; readonly row: number; readonly column: number; readonly rows: number; readonly columns: number }[];
  readonly settings: Map<string, string>;
}
