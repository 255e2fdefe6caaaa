/** How many cells the block of PEAKFIT fills; a test holds it to the function itself. */
export const PEAK_BLOCK = { rows: 13, columns: 4 } as const;
