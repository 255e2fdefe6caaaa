/** Why a cell shows an error, by sheet and cell, as the function said it. */
export type Messages = Map<string, string>;

export const messageKey = (sheetId: string, row: number, column: number): string => `${sheetId}/${row}/${column}`;
