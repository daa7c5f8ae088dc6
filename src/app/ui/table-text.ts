const MINUS = /\u2212/g;
/** Spaces that group the digits of a number. */
const GROUP = /(\d)[\u00a0\u2009\u202f](?=\d)/g;
const DASH = /^[\u2013\u2014]$/;

/**
 * A table as tab-separated text for a spreadsheet: the heads with their units first, numbers with a plain minus sign and
 * without spaces between digits, so that they stay numbers. Columns without a head, such as those of buttons, are left out.
 */
export function tableText(table: HTMLTableElement): string {
  const heads = [...(table.tHead?.rows[0]?.cells ?? [])].map(cellText);
  const kept = heads.flatMap((head, i) => (head === '' ? [] : [i]));
  const rows = [...table.tBodies].flatMap((body) => [...body.rows]).map((row) => kept.map((i) => (row.cells[i] ? plainNumber(cellText(row.cells[i])) : '')));
  return [kept.map((i) => heads[i]), ...rows].map((row) => row.join('\t')).join('\n');
}

function cellText(cell: HTMLTableCellElement): string {
  const field = cell.querySelector('input');
  if (field && field.type !== 'checkbox' && field.type !== 'radio') return field.value;
  const copy = cell.cloneNode(true) as HTMLElement;
  copy.querySelectorAll('svg, [hidden], .visually-hidden').forEach((part) => part.remove());
  return (copy.textContent ?? '').replace(/[ \t\n\r]+/g, ' ').trim();
}

function plainNumber(text: string): string {
  return DASH.test(text) ? '' : text.replace(MINUS, '-').replace(GROUP, '$1');
}
