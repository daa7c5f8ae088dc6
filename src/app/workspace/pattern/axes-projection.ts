/** A point of the drawing of axes, in pixels from the origin of the axes; y downwards. */
export interface AxesPoint {
  readonly x: number;
  readonly y: number;
}

/** Turn and tilt of the eye: x comes forward to the right, y goes back to the right, z is up. */
const TURN_RAD = (-38 * Math.PI) / 180;
const TILT_RAD = (22 * Math.PI) / 180;

/** Parallel projection of a point in units of the longest axis. */
export function projected(x: number, y: number, z: number, scalePx: number): AxesPoint {
  const right = x * Math.cos(TURN_RAD) - y * Math.sin(TURN_RAD);
  const back = x * Math.sin(TURN_RAD) + y * Math.cos(TURN_RAD);
  return { x: right * scalePx, y: -(z * Math.cos(TILT_RAD) + back * Math.sin(TILT_RAD)) * scalePx };
}

export interface AxesDrawing {
  readonly panel: string;
  readonly x: AxesPoint;
  readonly y: AxesPoint;
  readonly z: AxesPoint;
  readonly beam: AxesPoint;
  /** Foot of the beam in the panel. */
  readonly foot: AxesPoint;
  readonly thetaArc: string;
  readonly phiArc: string;
  readonly thetaLabel: AxesPoint;
  readonly phiLabel: AxesPoint;
  /** The electric field, an arrow in the panel. */
  readonly fieldFrom: AxesPoint;
  readonly fieldTo: AxesPoint;
}

/** The panel with its axes, a beam, its angles and the direction of the electric field. */
export function axesDrawing(beam: { readonly thetaDeg: number; readonly phiDeg: number }, field: 'x' | 'y' | null, scalePx: number): AxesDrawing {
  const [theta, phi] = [(beam.thetaDeg * Math.PI) / 180, (beam.phiDeg * Math.PI) / 180];
  const at = (x: number, y: number, z: number): AxesPoint => projected(x, y, z, scalePx);
  const along = (angle: number, length: number): AxesPoint => at(length * Math.sin(angle) * Math.cos(phi), length * Math.sin(angle) * Math.sin(phi), length * Math.cos(angle));
  const round = (angle: number, length: number): AxesPoint => at(length * Math.cos(angle), length * Math.sin(angle), 0);
  const arc = (points: readonly AxesPoint[]): string => points.map(({ x, y }, i) => `${i === 0 ? 'M' : 'L'}${x.toFixed(1)} ${y.toFixed(1)}`).join('');
  const sweep = (to: number, place: (angle: number) => AxesPoint): readonly AxesPoint[] => Array.from({ length: 17 }, (_, i) => place((to * i) / 16));
  const half = 0.52;
  return {
    panel: `${arc([at(-half, -half, 0), at(half, -half, 0), at(half, half, 0), at(-half, half, 0)])}Z`,
    x: at(0.95, 0, 0),
    y: at(0, 0.95, 0),
    z: at(0, 0, 1),
    beam: along(theta, 1.05),
    foot: at(1.05 * Math.sin(theta) * Math.cos(phi), 1.05 * Math.sin(theta) * Math.sin(phi), 0),
    thetaArc: arc(sweep(theta, (angle) => along(angle, 0.62))),
    phiArc: arc(sweep(phi, (angle) => round(angle, 0.4))),
    thetaLabel: along(theta / 2, 0.76),
    phiLabel: round(phi / 2, 0.52),
    fieldFrom: field === 'y' ? at(-0.36, -0.3, 0) : at(-0.44, -0.36, 0),
    fieldTo: field === 'y' ? at(-0.36, 0.1, 0) : at(-0.04, -0.36, 0),
  };
}
