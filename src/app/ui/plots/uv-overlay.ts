import { discPoint, uvOf } from './uv-geometry';
import type { UvDisc } from './uv-geometry';

const RING_STEP_DEG = 15;
/** Azimuth along which the rings are labelled, clear of the axes. */
const LABEL_PHI_DEG = 250;

export const TAG_WIDTH = 68;
export const TAG_HEIGHT = 36;

/** Circles of theta, labelled. */
export function thetaRings(disc: UvDisc): readonly { readonly thetaDeg: number; readonly radius: number; readonly labelX: number; readonly labelY: number }[] {
  return [15, 30, 45, 60, 75].map((thetaDeg) => {
    const { x, y } = discPoint(disc, uvOf({ thetaDeg, phiDeg: LABEL_PHI_DEG }));
    return { thetaDeg, radius: disc.radius * Math.sin((thetaDeg * Math.PI) / 180), labelX: x, labelY: y };
  });
}

/** Ticks of azimuth outside the visible circle and dotted spokes inside. */
export function azimuthTicks(disc: UvDisc): readonly { readonly phiDeg: number; readonly tick: string; readonly spoke: string; readonly labelX: number; readonly labelY: number }[] {
  return Array.from({ length: 360 / (2 * RING_STEP_DEG) }, (_, i) => {
    const phiDeg = 2 * RING_STEP_DEG * i;
    const at = (radius: number): string => {
      const { x, y } = discPoint({ ...disc, radius }, uvOf({ thetaDeg: 90, phiDeg }));
      return `${x.toFixed(1)} ${y.toFixed(1)}`;
    };
    const label = discPoint({ ...disc, radius: disc.radius + 17 }, uvOf({ thetaDeg: 90, phiDeg }));
    return { phiDeg, tick: `M${at(disc.radius)}L${at(disc.radius + 6)}`, spoke: `M${at(disc.radius * 0.07)}L${at(disc.radius)}`, labelX: label.x, labelY: label.y + 4 };
  });
}

/** The tag of the beam stands in that corner outside the circle which is nearest, where it covers no label; a leader joins them. */
export function tagCorner(disc: UvDisc, handle: { readonly x: number; readonly y: number }, pad: number): { readonly x: number; readonly y: number; readonly leader: string } {
  const side = 2 * (disc.radius + pad);
  const right = handle.x >= disc.centre;
  const upper = handle.y <= disc.centre;
  const x = right ? side - TAG_WIDTH : 0;
  const y = upper ? 0 : side - TAG_HEIGHT;
  const [fromX, fromY] = [right ? x + 14 : x + TAG_WIDTH - 14, upper ? y + TAG_HEIGHT : y];
  const apart = Math.hypot(handle.x - fromX, handle.y - fromY);
  const rim = Math.min(18, apart) / Math.max(1, apart);
  const [toX, toY] = [handle.x + (fromX - handle.x) * rim, handle.y + (fromY - handle.y) * rim];
  return { x, y, leader: `M${fromX.toFixed(1)} ${fromY.toFixed(1)}L${toX.toFixed(1)} ${toY.toFixed(1)}` };
}
