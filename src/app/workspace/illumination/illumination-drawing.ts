import { outlineTrace } from '../../../../shared/antenna/outline';
import { siPanel } from '../../../../shared/antenna/si-design';
import type { DesignDocument } from '../../../../shared/model/design-document';
import { horizontalDimension, millimetreText, uprightDimension } from '../drawing/dimension-line';
import type { DimensionLine, DrawnPoint } from '../drawing/dimension-line';

/** The panel from its side, to scale, in pixels: across the plane that holds z and the horn. */
export interface IlluminationDrawing {
  readonly width: number;
  readonly height: number;
  readonly pixelsPerMm: number;
  /** Azimuth of the drawn plane: its horizontal axis points there. */
  readonly planePhiDeg: number;
  readonly panelFrom: DrawnPoint;
  readonly panelTo: DrawnPoint;
  readonly origin: DrawnPoint;
  /** Directions and lengths of what arrives and leaves. */
  readonly axis: string;
  readonly rays: string;
  readonly beams: readonly { readonly path: string; readonly tip: DrawnPoint; readonly label: string }[];
  /** Null for a plane wave. */
  readonly horn: { readonly path: string; readonly at: DrawnPoint } | null;
  readonly wavefronts: string | null;
  readonly offsetArc: { readonly path: string; readonly textAt: DrawnPoint; readonly text: string } | null;
  readonly dimensions: readonly DimensionLine[];
}

interface Section {
  readonly planePhiDeg: number;
  /** Millimetres along the horizontal axis of the plane. */
  readonly panelFrom: number;
  readonly panelTo: number;
}

interface Placing {
  x(acrossMm: number): number;
  y(heightMm: number): number;
}

const MARGIN = { left: 64, right: 40, top: 40, bottom: 52 };
const DEG = Math.PI / 180;
const HORN_LENGTH_PX = 26;
const n = (value: number): string => String(Math.round(value * 100) / 100);

export function illuminationDrawing(design: DesignDocument, space: { readonly width: number; readonly height: number }): IlluminationDrawing {
  const section = sectionOf(design);
  const reachMm = (section.panelTo - section.panelFrom) * 0.62;
  const extent = extentOf(design, section, reachMm);
  const pixelsPerMm = Math.min(
    (space.width - MARGIN.left - MARGIN.right) / (extent.right - extent.left),
    (space.height - MARGIN.top - MARGIN.bottom) / (extent.top - extent.bottom),
  );
  const height = (extent.top - extent.bottom) * pixelsPerMm + MARGIN.top + MARGIN.bottom;
  const slack = (space.width - MARGIN.left - MARGIN.right - (extent.right - extent.left) * pixelsPerMm) / 2;
  const place: Placing = {
    x: (across) => MARGIN.left + slack + (across - extent.left) * pixelsPerMm,
    y: (up) => MARGIN.top + (extent.top - up) * pixelsPerMm,
  };
  return {
    width: space.width,
    height,
    pixelsPerMm,
    planePhiDeg: section.planePhiDeg,
    panelFrom: { x: place.x(section.panelFrom), y: place.y(0) },
    panelTo: { x: place.x(section.panelTo), y: place.y(0) },
    origin: { x: place.x(0), y: place.y(0) },
    beams: beamsOf(design, section, place, reachMm),
    ...LIT_PARTS[design.illumination.kind](design, section, place),
  };
}

/** The plane of the horn's offset; of a centred one the x-z plane. Its axis points to the half with positive x. */
function sectionOf({ illumination, panel }: DesignDocument): Section {
  const [x, y] = illumination.kind === 'horn' ? illumination.positionMm : alongAzimuth(illumination);
  const centred = Math.hypot(x, y) < 1e-9;
  const raw = centred ? 0 : Math.atan2(y, x) / DEG;
  const planePhiDeg = raw > 90 + 1e-9 ? raw - 180 : raw <= -90 + 1e-9 ? raw + 180 : raw;
  const along = { x: Math.cos(planePhiDeg * DEG), y: Math.sin(planePhiDeg * DEG) };
  const reaches = outlineTrace(siPanel(panel).outline, 360).map((point) => (point.xM * along.x + point.yM * along.y) * 1000);
  return { planePhiDeg, panelFrom: Math.min(...reaches), panelTo: Math.max(...reaches) };
}

function alongAzimuth(illumination: Exclude<DesignDocument['illumination'], { kind: 'horn' }>): readonly [number, number] {
  if (illumination.kind === 'plane-wave') return [Math.cos(illumination.phiDeg * DEG), Math.sin(illumination.phiDeg * DEG)];
  const directionDeg = illumination.launch.kind === 'plane' ? illumination.launch.directionDeg : 0;
  return [Math.cos(directionDeg * DEG), Math.sin(directionDeg * DEG)];
}

function across([x, y]: readonly number[], { planePhiDeg }: Section): number {
  return x * Math.cos(planePhiDeg * DEG) + y * Math.sin(planePhiDeg * DEG);
}

function extentOf(design: DesignDocument, section: Section, reachMm: number) {
  const { illumination } = design;
  const points = [
    [section.panelFrom, 0],
    [section.panelTo, 0],
    [0, reachMm],
    ...design.requirement.beams.map(({ thetaDeg, phiDeg }) => [Math.sin(thetaDeg * DEG) * Math.cos((phiDeg - section.planePhiDeg) * DEG) * reachMm, 0]),
    ...(illumination.kind === 'horn' ? [[across(illumination.positionMm, section), illumination.positionMm[2]]] : []),
    ...(illumination.kind === 'plane-wave' ? [[Math.sin(illumination.thetaDeg * DEG) * reachMm, sideOf(design) * reachMm]] : []),
  ];
  return {
    left: Math.min(...points.map(([s]) => s)),
    right: Math.max(...points.map(([s]) => s)),
    bottom: Math.min(...points.map(([, z]) => z)),
    top: Math.max(...points.map(([, z]) => z)),
  };
}

/** The lit side: a plane wave falls on a transmitting panel from below. */
function sideOf({ panel }: DesignDocument): 1 | -1 {
  return panel.operation === 'transmit' ? -1 : 1;
}

function beamsOf(design: DesignDocument, section: Section, place: Placing, reachMm: number): IlluminationDrawing['beams'] {
  return design.requirement.beams.slice(0, 4).map(({ thetaDeg, phiDeg }, index) => {
    const s = Math.sin(thetaDeg * DEG) * Math.cos((phiDeg - section.planePhiDeg) * DEG);
    const tip = { x: place.x(s * reachMm), y: place.y(Math.cos(thetaDeg * DEG) * reachMm) };
    const label = design.requirement.beams.length === 1 ? `beam θ ${n(thetaDeg)}°` : `beam ${index + 1}`;
    return { path: arrow({ x: place.x(0), y: place.y(0) }, tip), tip, label };
  });
}

function arrow(from: DrawnPoint, to: DrawnPoint): string {
  const turn = Math.atan2(to.y - from.y, to.x - from.x);
  const barb = (side: number): string => `${n(to.x - 9 * Math.cos(turn + side * 0.35))} ${n(to.y - 9 * Math.sin(turn + side * 0.35))}`;
  return `M${n(from.x)} ${n(from.y)}L${n(to.x)} ${n(to.y)}M${barb(1)}L${n(to.x)} ${n(to.y)}L${barb(-1)}`;
}

const LIT_PARTS: Readonly<Record<DesignDocument['illumination']['kind'], (design: DesignDocument, section: Section, place: Placing) => LitParts>> = {
  horn: hornParts,
  'plane-wave': waveParts,
  'guided-wave': guidedParts,
};

/** Arrows under the panel along the way of the wave, from its edge or from its launch to both sides. */
function guidedParts({ illumination }: DesignDocument, section: Section, place: Placing): LitParts {
  if (illumination.kind !== 'guided-wave') throw new Error('guidedParts needs a guided wave');
  const { launch } = illumination;
  const below = place.y(0) + 12;
  const [from, to] = [place.x(section.panelFrom), place.x(section.panelTo)];
  const towards = (start: number, end: number): string => arrow({ x: start, y: below }, { x: end, y: below });
  // The axis of the drawing points to the half with positive x: a wave towards the other half runs against it.
  const forward = launch.kind !== 'plane' || Math.cos((launch.directionDeg - section.planePhiDeg) * DEG) >= 0;
  const start = launch.kind === 'plane' ? (forward ? from : to) : place.x(across(launch.centreMm, section));
  const ends = launch.kind === 'plane' ? [forward ? to : from] : [from, to];
  return {
    axis: ends.map((end) => towards(start, end)).join(''),
    rays: '',
    horn: null,
    wavefronts: null,
    offsetArc: null,
    dimensions: [horizontalDimension({ fromX: from, toX: to, edgeY: place.y(0), lineY: place.y(0) + 38, text: millimetreText(section.panelTo - section.panelFrom) })],
  };
}

type LitParts = Pick<IlluminationDrawing, 'axis' | 'rays' | 'horn' | 'wavefronts' | 'offsetArc' | 'dimensions'>;

function hornParts(design: DesignDocument, section: Section, place: Placing): LitParts {
  if (design.illumination.kind !== 'horn') throw new Error('hornParts needs a horn');
  const { positionMm, aimMm } = design.illumination;
  const s = across(positionMm, section);
  const at = { x: place.x(s), y: place.y(positionMm[2]) };
  const aim = { x: place.x(across(aimMm, section)), y: place.y(aimMm[2]) };
  const edges = [section.panelFrom, section.panelTo].map((edge) => `M${n(at.x)} ${n(at.y)}L${n(place.x(edge))} ${n(place.y(0))}`);
  const panelY = place.y(0);
  const below = positionMm[2] >= 0 ? 1 : -1;
  const side = s <= (section.panelFrom + section.panelTo) / 2 ? -1 : 1;
  const edgeX = Math[side < 0 ? 'min' : 'max'](place.x(s), place.x(side < 0 ? section.panelFrom : section.panelTo));
  const dimensions = [
    horizontalDimension({ fromX: place.x(section.panelFrom), toX: place.x(section.panelTo), edgeY: panelY, lineY: panelY + below * 38, text: millimetreText(section.panelTo - section.panelFrom) }),
    uprightDimension({ fromY: panelY, toY: at.y, edgeX, lineX: edgeX + side * 26, text: millimetreText(Math.abs(positionMm[2])) }),
  ];
  if (Math.abs(s) > 0.005) {
    const text = millimetreText(Math.abs(s));
    dimensions.push(horizontalDimension({ fromX: Math.min(place.x(s), place.x(0)), toX: Math.max(place.x(s), place.x(0)), edgeY: at.y, lineY: at.y - below * 24, text }));
  }
  return {
    axis: `M${n(at.x)} ${n(at.y)}L${n(aim.x)} ${n(aim.y)}`,
    rays: edges.join(''),
    horn: { path: hornPath(at, aim), at },
    wavefronts: null,
    offsetArc: offsetArc(at, aim),
    dimensions,
  };
}

/** A sectoral horn with its phase centre at the mouth, looking along its axis. */
function hornPath(at: DrawnPoint, aim: DrawnPoint): string {
  const turn = Math.atan2(aim.y - at.y, aim.x - at.x);
  const point = (alongPx: number, asidePx: number): string =>
    `${n(at.x + alongPx * Math.cos(turn) - asidePx * Math.sin(turn))} ${n(at.y + alongPx * Math.sin(turn) + asidePx * Math.cos(turn))}`;
  return `M${point(0, 11)}L${point(-HORN_LENGTH_PX + 8, 4)}L${point(-HORN_LENGTH_PX, 4)}L${point(-HORN_LENGTH_PX, -4)}L${point(-HORN_LENGTH_PX + 8, -4)}L${point(0, -11)}Z`;
}

/** Angle between the axis of the horn and the normal of the panel, drawn at the horn. */
function offsetArc(at: DrawnPoint, aim: DrawnPoint): IlluminationDrawing['offsetArc'] {
  const down = aim.y > at.y ? 1 : -1;
  const angleRad = Math.atan2(aim.x - at.x, Math.abs(aim.y - at.y));
  if (Math.abs(angleRad) < 0.005) return null;
  const radius = 58;
  const end = { x: at.x + radius * Math.sin(angleRad), y: at.y + down * radius * Math.cos(angleRad) };
  const sweep = angleRad > 0 === down > 0 ? 0 : 1;
  const mid = angleRad / 2;
  return {
    path: `M${n(at.x)} ${n(at.y)}V${n(at.y + down * (radius + 8))}M${n(at.x)} ${n(at.y + down * radius)}A${radius} ${radius} 0 0 ${sweep} ${n(end.x)} ${n(end.y)}`,
    textAt: { x: at.x + (radius + 14) * Math.sin(mid), y: at.y + down * (radius + 14) * Math.cos(mid) + 4 },
    text: `${(Math.abs(angleRad) / DEG).toFixed(1)}°`,
  };
}

function waveParts(design: DesignDocument, section: Section, place: Placing): LitParts {
  if (design.illumination.kind !== 'plane-wave') throw new Error('waveParts needs a plane wave');
  const { thetaDeg, phiDeg } = design.illumination;
  const lit = sideOf(design);
  const reach = (section.panelTo - section.panelFrom) * 0.6;
  const sign = Math.cos((phiDeg - section.planePhiDeg) * DEG) >= 0 ? 1 : -1;
  const from = { x: place.x(sign * Math.sin(thetaDeg * DEG) * reach), y: place.y(lit * Math.cos(thetaDeg * DEG) * reach) };
  const to = { x: place.x(0), y: place.y(0) };
  const turn = Math.atan2(to.y - from.y, to.x - from.x);
  const front = (share: number): string => {
    const x = from.x + (to.x - from.x) * share;
    const y = from.y + (to.y - from.y) * share;
    return `M${n(x - 46 * Math.sin(turn))} ${n(y + 46 * Math.cos(turn))}L${n(x + 46 * Math.sin(turn))} ${n(y - 46 * Math.cos(turn))}`;
  };
  const panelY = place.y(0);
  const text = millimetreText(section.panelTo - section.panelFrom);
  return {
    axis: arrow(from, to),
    rays: '',
    horn: null,
    wavefronts: [0.1, 0.22, 0.34].map(front).join(''),
    offsetArc: null,
    dimensions: [horizontalDimension({ fromX: place.x(section.panelFrom), toX: place.x(section.panelTo), edgeY: panelY, lineY: panelY + lit * 38, text })],
  };
}
