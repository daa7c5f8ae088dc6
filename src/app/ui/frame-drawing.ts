/** Where the lines and letters of a drawing frame stand, in pixels. */
export interface FrameDrawing {
  readonly width: number;
  readonly height: number;
  readonly zone: number;
  readonly ticks: string;
  readonly centres: string;
  readonly labels: readonly { readonly key: string; readonly x: number; readonly y: number; readonly text: string }[];
}

const ZONE = 15;
const COLUMNS = 8;
const LETTERS = 'ABCDEFGH';
/** Below this a zone is shorter than its letter and its ticks are worth. */
const LEAST_ZONE = 90;

/** Zones are numbered along the long edges and lettered along the short ones; null before the sheet has a size. */
export function frameDrawing({ width, height }: { width: number; height: number }): FrameDrawing | null {
  if (width < 4 * ZONE || height < 4 * ZONE) return null;
  // Even counts, so that the centre marks fall between two zones and not on a letter.
  const columns = 2 * Math.max(1, Math.min(COLUMNS / 2, Math.floor(width / LEAST_ZONE / 2)));
  const rows = 2 * Math.max(1, Math.min(LETTERS.length / 2, Math.round(height / 440)));
  const across = (i: number): number => ZONE + ((width - 2 * ZONE) * i) / columns;
  const down = (j: number): number => ZONE + ((height - 2 * ZONE) * j) / rows;
  const ticks: string[] = [];
  const labels: { key: string; x: number; y: number; text: string }[] = [];
  for (let i = 0; i < columns; i++) {
    if (i > 0) ticks.push(`M${across(i)} 0V${ZONE}M${across(i)} ${height - ZONE}V${height}`);
    for (const [edge, y] of [['top', ZONE / 2], ['bottom', height - ZONE / 2]] as const) {
      labels.push({ key: `${edge}${i}`, x: across(i + 0.5), y: y + 3.5, text: String(i + 1) });
    }
  }
  for (let j = 0; j < rows; j++) {
    if (j > 0) ticks.push(`M0 ${down(j)}H${ZONE}M${width - ZONE} ${down(j)}H${width}`);
    for (const [edge, x] of [['left', ZONE / 2], ['right', width - ZONE / 2]] as const) {
      labels.push({ key: `${edge}${j}`, x, y: down(j + 0.5) + 3.5, text: LETTERS[j] });
    }
  }
  const [middle, centre] = [width / 2, height / 2];
  const centres = `M${middle} 0V${ZONE}M${middle} ${height - ZONE}V${height}M0 ${centre}H${ZONE}M${width - ZONE} ${centre}H${width}`;
  return { width, height, zone: ZONE, ticks: ticks.join(''), centres, labels };
}
