/** The sheets of a panel in the order of the work. The place in the list plus one is the number in the rail. */
export const SHEETS = [
  { id: 'requirement', title: 'Requirement' },
  { id: 'panel', title: 'Panel' },
  { id: 'illumination', title: 'Illumination' },
  { id: 'cells', title: 'Cells' },
  { id: 'phase', title: 'Phase' },
  { id: 'pattern', title: 'Pattern' },
  { id: 'band', title: 'Band' },
  { id: 'tolerance', title: 'Tolerance' },
  { id: 'revisions', title: 'Revisions' },
] as const;

export type SheetId = (typeof SHEETS)[number]['id'];

export function sheetNumber(id: SheetId): number {
  return SHEETS.findIndex((sheet) => sheet.id === id) + 1;
}
