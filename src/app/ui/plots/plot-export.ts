/** What stands above an exported plot and in its file name. */
export interface PlotHeading {
  readonly title: string;
  /** Project and panel. */
  readonly subject: string;
  /** "Revision 4" or "Draft after revision 3". */
  readonly state: string;
  /** Of the content shown. */
  readonly hash: string;
  /** ISO 8601, UTC. */
  readonly date: string;
}

/** The data of a plot as they are shown, one column each; the head carries the unit. */
export interface PlotTable {
  readonly columns: readonly { readonly head: string; readonly values: ArrayLike<number | string> }[];
}

/** The picture of a plot as the inside of an SVG document. */
export interface PlotPicture {
  readonly width: number;
  readonly height: number;
  readonly markup: string;
}

/** What every plot offers to its tools. The picture is drawn in the light theme: a print is always light. */
export interface ExportablePlot {
  exportPicture(): Promise<PlotPicture>;
  exportTable(): PlotTable;
}

const HEAD_HEIGHT = 58;
const MARGIN = 12;
const LINE_END = '\r\n';

export function escapeXml(text: string): string {
  return text.replace(/&/g, '&amp;').replace(/</g, '&lt;').replace(/>/g, '&gt;').replace(/"/g, '&quot;');
}

function stateLine({ state, hash, date }: PlotHeading): string {
  return [state, hash.slice(0, 12), date].filter((part) => part !== '').join('; ');
}

/** A self-contained SVG document on white with the heading above the picture; its text stays text. */
export function plotSvg(picture: PlotPicture, heading: PlotHeading, styles = ''): string {
  const width = Math.max(picture.width, 420) + 2 * MARGIN;
  const height = picture.height + HEAD_HEIGHT + 2 * MARGIN;
  const text = (y: number, style: string, content: string): string =>
    `<text x="${MARGIN}" y="${y}" style="${style}">${escapeXml(content)}</text>`;
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}" viewBox="0 0 ${width} ${height}">`,
    styles === '' ? '' : `<style>${styles}</style>`,
    `<title>${escapeXml(heading.title)}</title>`,
    `<rect width="${width}" height="${height}" fill="#ffffff"/>`,
    text(MARGIN + 13, "font:600 14px 'Archivo Variable',Archivo,sans-serif;fill:#1c2730", heading.title),
    text(MARGIN + 30, "font:400 11px 'IBM Plex Mono',monospace;fill:#55606a", heading.subject),
    text(MARGIN + 45, "font:400 11px 'IBM Plex Mono',monospace;fill:#55606a", stateLine(heading)),
    `<g transform="translate(${MARGIN} ${MARGIN + HEAD_HEIGHT})">${picture.markup}</g>`,
    '</svg>',
  ].join('\n');
}

/** The table as CSV after RFC 4180, with three lines of heading that start with "#". Numbers have twelve digits. */
export function plotCsv(table: PlotTable, heading: PlotHeading): string {
  const { columns } = table;
  const length = Math.max(0, ...columns.map(({ values }) => values.length));
  const lines = [`# ${heading.title}`, `# ${heading.subject}`, `# ${stateLine(heading)}`, columns.map(({ head }) => csvField(head)).join(',')];
  for (let i = 0; i < length; i++) lines.push(columns.map(({ values }) => (i < values.length ? csvField(values[i]) : '')).join(','));
  return lines.join(LINE_END) + LINE_END;
}

function csvField(value: number | string): string {
  // Twelve digits are more than any plot shows and fewer than binary noise reaches.
  if (typeof value === 'number') return Number.isFinite(value) ? String(Number(value.toPrecision(12))) : '';
  return /[",\r\n]/.test(value) ? `"${value.replace(/"/g, '""')}"` : value;
}

/** Letters, digits and hyphens only. */
export function plotFileName(heading: PlotHeading, extension: string): string {
  const name = `${heading.title} ${heading.state} ${heading.hash.slice(0, 8)}`;
  const plain = name.toLowerCase().replace(/[^a-z0-9]+/g, '-').replace(/^-|-$/g, '');
  return `${plain}.${extension}`;
}
