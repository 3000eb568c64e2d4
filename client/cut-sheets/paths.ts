export function sheetPath(sheetId: string): string {
  return `/cut-sheets/${sheetId}`;
}

export function sheetVersionPath(sheetId: string, number: number): string {
  return `/cut-sheets/${sheetId}/versions/${String(number)}`;
}
