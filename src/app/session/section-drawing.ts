/** What a section of a horn-fed panel shows, in millimetres and degrees; the plane of the drawing is y = 0. */
export interface SectionSubject {
  readonly panelWidthMm: number;
  readonly hornXMm: number;
  readonly hornZMm: number;
  readonly beamThetaDeg: number;
  readonly wavelengthMm: number;
  /** Phase each cell of the middle row adds, in degrees, from the lowest x. */
  readonly cellPhasesDeg: readonly number[];
}

/** From millimetres to pixels of the picture. */
export interface SectionScale {
  readonly width: number;
  readonly height: number;
  readonly pixelsPerMm: number;
  readonly originX: number;
  readonly originY: number;
}

export interface SectionLabel {
  readonly x: number;
  readonly y: number;
  readonly text: string;
  readonly upright: boolean;
}

/** Paths in pixels. */
export interface SectionDrawing {
  readonly axis: string;
  readonly rays: string;
  readonly arcs: string;
  readonly horn: { readonly path: string; readonly transform: string };
  readonly slab: { readonly x: number; readonly y: number; readonly width: number; readonly height: number };
  readonly ground: string;
  readonly copper: string;
  readonly beam: string;
  readonly dimensions: string;
  readonly labels: readonly SectionLabel[];
}

/** Below the panel stand its width and a margin; above the horn its offset. */
const FOOT = 74;
const CSS_PIXELS_PER_MM = 96 / 25.4;
const LEAST_HEIGHT_MM = 296;
const LEAST_WIDTH_MM = 310;

/** Fits the section into a picture: the panel at the foot, the wave free to run out of it at the top and the right. */
export function sectionScale(width: number, height: number): SectionScale {
  const pixelsPerMm = Math.max(0.2, Math.min((height - FOOT) / LEAST_HEIGHT_MM, width / LEAST_WIDTH_MM));
  return { width, height, pixelsPerMm, originX: Math.max(width * 0.42, 148 * pixelsPerMm), originY: height - FOOT };
}

/** "1 : 1.5", for a screen of 96 pixels to the inch. */
export function scaleText({ pixelsPerMm }: SectionScale): string {
  const ratio = CSS_PIXELS_PER_MM / pixelsPerMm;
  return ratio >= 1 ? `1 : ${ratio.toPrecision(2)}` : `${(1 / ratio).toPrecision(2)} : 1`;
}

export function sectionDrawing(subject: SectionSubject, scale: SectionScale): SectionDrawing {
  const { pixelsPerMm, originX, originY } = scale;
  const half = (subject.panelWidthMm / 2) * pixelsPerMm;
  const hornX = originX + subject.hornXMm * pixelsPerMm;
  const hornY = originY - subject.hornZMm * pixelsPerMm;
  const thickness = Math.max(7, 3 * pixelsPerMm);
  return {
    axis: `M${px(originX)} ${px(originY + thickness + 14)}V0`,
    rays: `M${px(originX - half)} ${px(originY)}L${px(hornX)} ${px(hornY)}L${px(originX + half)} ${px(originY)}`,
    arcs: hornArcs(subject, scale),
    horn: { path: hornPath(pixelsPerMm), transform: `translate(${px(hornX)} ${px(hornY)}) rotate(${px(hornTiltDeg(subject))})` },
    slab: { x: originX - half, y: originY, width: 2 * half, height: thickness },
    ground: `M${px(originX - half)} ${px(originY + thickness + 1)}h${px(2 * half)}`,
    copper: copperStrips(subject, scale),
    beam: beamPath(subject, scale),
    ...dimensions(subject, scale, thickness),
  };
}

const px = (value: number): string => String(Math.round(value * 10) / 10);

function hornTiltDeg({ hornXMm, hornZMm }: SectionSubject): number {
  return (Math.atan2(hornXMm, hornZMm) * 180) / Math.PI;
}

/** The horn about its phase centre, mouth downwards. */
function hornPath(pixelsPerMm: number): string {
  const s = pixelsPerMm / 2.2;
  return `M${px(-9 * s)} ${px(6 * s)}L${px(-4 * s)} ${px(-20 * s)}V${px(-38 * s)}H${px(4 * s)}V${px(-20 * s)}L${px(9 * s)} ${px(6 * s)}ZM${px(-4 * s)} ${px(-20 * s)}H${px(4 * s)}`;
}

/** Crests of the wave from the horn, one a wavelength, between the rays to the edges of the panel. */
function hornArcs(subject: SectionSubject, { pixelsPerMm, originX, originY }: SectionScale): string {
  const { hornXMm, hornZMm, panelWidthMm, wavelengthMm } = subject;
  const from = Math.atan2(-panelWidthMm / 2 - hornXMm, hornZMm);
  const to = Math.atan2(panelWidthMm / 2 - hornXMm, hornZMm);
  const furthest = Math.hypot(panelWidthMm / 2 + Math.abs(hornXMm), hornZMm);
  let path = '';
  for (let radius = 2 * wavelengthMm; radius < furthest; radius += wavelengthMm) {
    let drawing = false;
    for (let step = 0; step <= 40; step++) {
      const angle = from + ((to - from) * step) / 40;
      const zMm = hornZMm - radius * Math.cos(angle);
      if (zMm < 0) {
        drawing = false;
        continue;
      }
      path += `${drawing ? 'L' : 'M'}${px(originX + (hornXMm + radius * Math.sin(angle)) * pixelsPerMm)} ${px(originY - zMm * pixelsPerMm)}`;
      drawing = true;
    }
  }
  return path;
}

/** One strip a cell, the wider the more phase the cell adds. */
function copperStrips({ cellPhasesDeg, panelWidthMm }: SectionSubject, { pixelsPerMm, originX, originY }: SectionScale): string {
  const stepMm = panelWidthMm / cellPhasesDeg.length;
  return cellPhasesDeg
    .map((phaseDeg, n) => {
      const widthMm = stepMm * (0.2 + (0.65 * phaseDeg) / 360);
      const middleMm = (n + 0.5) * stepMm - panelWidthMm / 2;
      return `M${px(originX + (middleMm - widthMm / 2) * pixelsPerMm)} ${px(originY - 1.5)}h${px(widthMm * pixelsPerMm)}`;
    })
    .join('');
}

const BEAM_LENGTH_MM = 250;
const ANGLE_RADIUS_MM = 150;

function beamPath({ beamThetaDeg }: SectionSubject, { pixelsPerMm, originX, originY }: SectionScale): string {
  const theta = (beamThetaDeg * Math.PI) / 180;
  const tipX = originX + BEAM_LENGTH_MM * pixelsPerMm * Math.sin(theta);
  const tipY = originY - BEAM_LENGTH_MM * pixelsPerMm * Math.cos(theta);
  const barb = (turn: number): string => `M${px(tipX)} ${px(tipY)}l${px(-11 * Math.sin(theta + turn))} ${px(11 * Math.cos(theta + turn))}`;
  return `M${px(originX)} ${px(originY)}L${px(tipX)} ${px(tipY)}${barb(0.4)}${barb(-0.4)}`;
}

const slash = (x: number, y: number): string => `M${px(x - 3.5)} ${px(y + 3.5)}l7 -7`;

/** Dimension lines with oblique strokes at their ends and extension lines that stop short of what they measure. */
function dimensions(subject: SectionSubject, scale: SectionScale, thickness: number): { dimensions: string; labels: SectionLabel[] } {
  const { pixelsPerMm, originX, originY } = scale;
  const left = originX - (subject.panelWidthMm / 2) * pixelsPerMm;
  const right = originX + (subject.panelWidthMm / 2) * pixelsPerMm;
  const hornX = originX + subject.hornXMm * pixelsPerMm;
  const hornY = originY - subject.hornZMm * pixelsPerMm;
  const widthY = originY + thickness + 24;
  const offsetY = hornY - 28 * pixelsPerMm;
  const heightX = left - 30;
  const theta = (subject.beamThetaDeg * Math.PI) / 180;
  const radius = ANGLE_RADIUS_MM * pixelsPerMm;
  const arc = `M${px(originX)} ${px(originY - radius)}A${px(radius)} ${px(radius)} 0 0 1 ${px(originX + radius * Math.sin(theta))} ${px(originY - radius * Math.cos(theta))}`;
  const lines = [
    `M${px(left)} ${px(originY + thickness + 6)}V${px(widthY + 5)}M${px(right)} ${px(originY + thickness + 6)}V${px(widthY + 5)}M${px(left)} ${px(widthY)}H${px(right)}`,
    slash(left, widthY) + slash(right, widthY),
    `M${px(hornX)} ${px(offsetY - 5)}V${px(offsetY + 18)}M${px(hornX)} ${px(offsetY)}H${px(originX)}`,
    slash(hornX, offsetY) + slash(originX, offsetY),
    `M${px(heightX - 5)} ${px(hornY)}h29M${px(heightX - 5)} ${px(originY)}h29M${px(heightX)} ${px(hornY)}V${px(originY)}`,
    slash(heightX, hornY) + slash(heightX, originY),
    arc,
  ];
  const labels = [
    { x: originX, y: widthY, text: subject.panelWidthMm.toFixed(2), upright: false },
    { x: (hornX + originX) / 2, y: offsetY, text: Math.abs(subject.hornXMm).toFixed(2), upright: false },
    { x: heightX, y: (hornY + originY) / 2, text: subject.hornZMm.toFixed(2), upright: true },
    { x: originX + radius * Math.sin(theta / 2), y: originY - radius * Math.cos(theta / 2), text: `${subject.beamThetaDeg.toFixed(1)}°`, upright: false },
  ];
  return { dimensions: lines.join(''), labels };
}
