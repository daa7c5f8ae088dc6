import { gaussLegendre } from '../math/quadrature';
import { outlineCorners } from './outline';
import type { SiOutline, SiPoint } from './si-design';

export interface IntegrationEffort {
  /** Nodes of the rule on each part. */
  readonly nodes: number;
  /** Largest part, in metres: the length over which the integrand changes little. */
  readonly partM: number;
  /** The integrand's highest point: parts are made finest about it. */
  readonly pivot: SiPoint;
}

const MAX_PARTS = 24;

/**
 * Integral of a smooth function over an outline, exactly along its edge: triangles from a pivot to each edge, with
 * the sign of their turn, so any simple polygon is covered; the ellipse in polar coordinates about its centre.
 */
export function integrateOverOutline(outline: SiOutline, f: (xM: number, yM: number) => number, effort: IntegrationEffort): number {
  if (outline.kind === 'ellipse') return integrateEllipse(outline, f, effort);
  const corners = outlineCorners(outline);
  let sum = 0;
  corners.forEach((from, i) => {
    sum += integrateTriangle([effort.pivot, from, corners[(i + 1) % corners.length]], f, effort);
  });
  const first = corners[0];
  const turn = corners.reduce((total, a, i) => {
    const b = corners[(i + 1) % corners.length];
    return total + (a.xM - first.xM) * (b.yM - first.yM) - (b.xM - first.xM) * (a.yM - first.yM);
  }, 0);
  return turn < 0 ? -sum : sum;
}

/**
 * The triangle as pivot + s (edge point - pivot), s from 0 to 1: area element s times twice the signed area. Parts in s
 * grow geometrically from the pivot.
 */
function integrateTriangle(corners: [SiPoint, SiPoint, SiPoint], f: (xM: number, yM: number) => number, effort: IntegrationEffort): number {
  const [o, a, b] = corners;
  const twiceArea = (a.xM - o.xM) * (b.yM - o.yM) - (b.xM - o.xM) * (a.yM - o.yM);
  if (twiceArea === 0) return 0;
  const edgeM = Math.hypot(b.xM - a.xM, b.yM - a.yM);
  const heightM = Math.abs(twiceArea) / edgeM;
  const reachM = Math.max(Math.hypot(a.xM - o.xM, a.yM - o.yM), Math.hypot(b.xM - o.xM, b.yM - o.yM));
  const edgeParts = partCount(edgeM, Math.max(effort.partM, heightM));
  const rule = gaussLegendre(effort.nodes);
  const cuts = geometricCuts(reachM, effort.partM);
  let sum = 0;
  for (let part = 0; part < edgeParts; part++) {
    for (let i = 0; i < rule.nodes.length; i++) {
      const t = (part + (rule.nodes[i] + 1) / 2) / edgeParts;
      const dx = a.xM + t * (b.xM - a.xM) - o.xM;
      const dy = a.yM + t * (b.yM - a.yM) - o.yM;
      sum += (rule.weights[i] / (2 * edgeParts)) * integrateRay({ o, dx, dy, cuts }, f, rule);
    }
  }
  return sum * twiceArea;
}

interface Ray {
  readonly o: SiPoint;
  readonly dx: number;
  readonly dy: number;
  readonly cuts: readonly number[];
}

function integrateRay({ o, dx, dy, cuts }: Ray, f: (xM: number, yM: number) => number, rule: ReturnType<typeof gaussLegendre>): number {
  let sum = 0;
  for (let c = 0; c + 1 < cuts.length; c++) {
    const half = (cuts[c + 1] - cuts[c]) / 2;
    for (let j = 0; j < rule.nodes.length; j++) {
      const s = cuts[c] + half * (rule.nodes[j] + 1);
      sum += rule.weights[j] * half * s * f(o.xM + s * dx, o.yM + s * dy);
    }
  }
  return sum;
}

function integrateEllipse(outline: Extract<SiOutline, { kind: 'ellipse' }>, f: (xM: number, yM: number) => number, effort: IntegrationEffort): number {
  const { centre, widthM, heightM } = outline;
  const radialParts = partCount(Math.max(widthM, heightM) / 2, effort.partM);
  // The trapezoidal rule on a closed curve converges faster than any power.
  const azimuths = Math.min(2048, 16 * effort.nodes * Math.max(1, Math.ceil(radialParts / 2)));
  const { nodes, weights } = gaussLegendre(effort.nodes);
  let sum = 0;
  for (let a = 0; a < azimuths; a++) {
    const x = (widthM / 2) * Math.cos((2 * Math.PI * a) / azimuths);
    const y = (heightM / 2) * Math.sin((2 * Math.PI * a) / azimuths);
    for (let part = 0; part < radialParts; part++) {
      for (let i = 0; i < nodes.length; i++) {
        const r = (part + (nodes[i] + 1) / 2) / radialParts;
        sum += (weights[i] / (2 * radialParts)) * r * f(centre.xM + r * x, centre.yM + r * y);
      }
    }
  }
  return (sum * ((2 * Math.PI) / azimuths) * widthM * heightM) / 4;
}

function partCount(lengthM: number, partM: number): number {
  return Math.min(MAX_PARTS, Math.max(1, Math.ceil(lengthM / partM)));
}

/** 0, then from a part's length on doubling up to the whole: fractions of the reach. */
function geometricCuts(reachM: number, partM: number): number[] {
  const cuts = [0];
  for (let at = partM / reachM; at < 0.75; at *= 2) cuts.push(at);
  cuts.push(1);
  return cuts;
}
