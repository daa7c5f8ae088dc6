import type { SiOutline, SiPoint } from './si-design';

/** Smallest upright rectangle around an outline. */
export interface OutlineBounds {
  readonly leftM: number;
  readonly rightM: number;
  readonly bottomM: number;
  readonly topM: number;
}

export function outlineBounds(outline: SiOutline): OutlineBounds {
  if (outline.kind === 'polygon') {
    const xs = outline.points.map((point) => point.xM);
    const ys = outline.points.map((point) => point.yM);
    return { leftM: Math.min(...xs), rightM: Math.max(...xs), bottomM: Math.min(...ys), topM: Math.max(...ys) };
  }
  const { centre, widthM, heightM } = outline;
  return {
    leftM: centre.xM - widthM / 2,
    rightM: centre.xM + widthM / 2,
    bottomM: centre.yM - heightM / 2,
    topM: centre.yM + heightM / 2,
  };
}

export function outlineAreaM2(outline: SiOutline): number {
  if (outline.kind === 'rectangle') return outline.widthM * outline.heightM;
  if (outline.kind === 'ellipse') return (Math.PI / 4) * outline.widthM * outline.heightM;
  return Math.abs(signedPolygonAreaM2(outline.points));
}

/** Positive where the points run counter-clockwise. */
export function signedPolygonAreaM2(points: readonly SiPoint[]): number {
  let twice = 0;
  points.forEach((point, i) => {
    const next = points[(i + 1) % points.length];
    twice += point.xM * next.yM - next.xM * point.yM;
  });
  return twice / 2;
}

/** Largest distance between two points of the outline: the D of 2 D^2 / lambda. */
export function largestDimensionM(outline: SiOutline): number {
  if (outline.kind === 'rectangle') return Math.hypot(outline.widthM, outline.heightM);
  if (outline.kind === 'ellipse') return Math.max(outline.widthM, outline.heightM);
  let largest = 0;
  outline.points.forEach((a, i) => {
    for (const b of outline.points.slice(i + 1)) largest = Math.max(largest, Math.hypot(a.xM - b.xM, a.yM - b.yM));
  });
  return largest;
}

/** Points about evenly spread along the outline. */
export function outlineTrace(outline: SiOutline, count: number): SiPoint[] {
  if (outline.kind === 'ellipse') {
    return Array.from({ length: count }, (_, i) => ({
      xM: outline.centre.xM + (outline.widthM / 2) * Math.cos((2 * Math.PI * i) / count),
      yM: outline.centre.yM + (outline.heightM / 2) * Math.sin((2 * Math.PI * i) / count),
    }));
  }
  const corners = outlineCorners(outline);
  const perSide = Math.max(1, Math.ceil(count / corners.length));
  return corners.flatMap((corner, i) => {
    const next = corners[(i + 1) % corners.length];
    return Array.from({ length: perSide }, (_, s) => ({
      xM: corner.xM + ((next.xM - corner.xM) * s) / perSide,
      yM: corner.yM + ((next.yM - corner.yM) * s) / perSide,
    }));
  });
}

/** Corners of a rectangle or polygon, in order. */
export function outlineCorners(outline: Exclude<SiOutline, { kind: 'ellipse' }>): readonly SiPoint[] {
  if (outline.kind === 'polygon') return outline.points;
  const { leftM, rightM, bottomM, topM } = outlineBounds(outline);
  return [
    { xM: leftM, yM: bottomM },
    { xM: rightM, yM: bottomM },
    { xM: rightM, yM: topM },
    { xM: leftM, yM: topM },
  ];
}

/**
 * The parts of the line y = yM that lie inside or on the outline, as [from, to] in x. Rounding of a centre that
 * stands on the outline must not lose it, so everything is widened by a billionth of the outline's size.
 */
export function rowIntervals(outline: SiOutline, yM: number): [number, number][] {
  const { leftM, rightM, bottomM, topM } = outlineBounds(outline);
  const slackM = 1e-9 * Math.max(rightM - leftM, topM - bottomM);
  if (yM < bottomM - slackM || yM > topM + slackM) return [];
  if (outline.kind === 'rectangle') return [[leftM - slackM, rightM + slackM]];
  if (outline.kind === 'ellipse') {
    const across = (2 * (yM - outline.centre.yM)) / outline.heightM;
    const half = (outline.widthM / 2) * Math.sqrt(Math.max(0, 1 - across * across));
    // Where the ellipse is nearly flat an error of y moves x by its square root; the point test stays one in (x/a)^2 + (y/b)^2.
    const widened = (outline.widthM / 2) * Math.sqrt(Math.max(0, 1 + 2e-9 - across * across));
    const reach = Math.max(half + slackM, widened);
    return [[outline.centre.xM - reach, outline.centre.xM + reach]];
  }
  return polygonIntervals(outline.points, yM, slackM);
}

function polygonIntervals(points: readonly SiPoint[], yM: number, slackM: number): [number, number][] {
  const crossings: number[] = [];
  const intervals: [number, number][] = [];
  points.forEach((a, i) => {
    const b = points[(i + 1) % points.length];
    if (Math.abs(a.yM - yM) <= slackM) intervals.push([a.xM - slackM, a.xM + slackM]);
    if (Math.abs(a.yM - yM) <= slackM && Math.abs(b.yM - yM) <= slackM) {
      intervals.push([Math.min(a.xM, b.xM) - slackM, Math.max(a.xM, b.xM) + slackM]);
    }
    if (a.yM <= yM !== b.yM <= yM) crossings.push(a.xM + ((yM - a.yM) / (b.yM - a.yM)) * (b.xM - a.xM));
  });
  crossings.sort((a, b) => a - b);
  for (let i = 0; i + 1 < crossings.length; i += 2) intervals.push([crossings[i] - slackM, crossings[i + 1] + slackM]);
  return intervals;
}
