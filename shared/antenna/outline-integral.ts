import { gaussLegendre, type QuadratureRule } from '../math/quadrature';
import { outlineCorners, signedPolygonAreaM2 } from './outline';
import type { SiOutline, SiPoint } from './si-design';

export interface IntegrationEffort {
  /** Nodes of the rule on each part. */
  readonly nodes: number;
  /** Largest part, in metres: the length over which the integrand changes little. */
  readonly partM: number;
  /** The integrand's highest point: parts are made finest about it. */
  readonly pivot: SiPoint;
}

/** Parts of one edge, and of a whole ellipse. */
const MAX_PARTS = 24;
const MAX_ELLIPSE_PARTS = 64;

type Integrand = (xM: number, yM: number) => number;

/** A piece of the outline's edge: a point of it and its derivative, for t from 0 to 1. */
interface EdgePiece {
  readonly parts: number;
  readonly reachM: number;
  at(t: number): { xM: number; yM: number; dxM: number; dyM: number };
}

/**
 * Integral of a smooth function over an outline, exactly along its edge: rays from a pivot to every point of the edge,
 * with the sign of their turn, so any simple outline is covered wherever the pivot lies.
 */
export function integrateOverOutline(outline: SiOutline, f: Integrand, effort: IntegrationEffort): number {
  const pieces = outline.kind === 'ellipse' ? [ellipsePiece(outline, effort)] : straightPieces(outlineCorners(outline), effort);
  const sum = pieces.reduce((total, piece) => total + integratePiece(piece, f, effort), 0);
  return outline.kind === 'polygon' && signedPolygonAreaM2(outline.points) < 0 ? -sum : sum;
}

/** Points pivot + s (edge point - pivot): the area element is s ds dt times the turn of the edge about the pivot. */
function integratePiece(piece: EdgePiece, f: Integrand, { nodes: count, partM, pivot }: IntegrationEffort): number {
  const rule = gaussLegendre(count);
  const cuts = geometricCuts(piece.reachM, partM);
  let sum = 0;
  for (let part = 0; part < piece.parts; part++) {
    for (let i = 0; i < rule.nodes.length; i++) {
      const { xM, yM, dxM, dyM } = piece.at((part + (rule.nodes[i] + 1) / 2) / piece.parts);
      const rayX = xM - pivot.xM;
      const rayY = yM - pivot.yM;
      const turn = rayX * dyM - rayY * dxM;
      if (turn !== 0) sum += (rule.weights[i] / (2 * piece.parts)) * turn * integrateRay({ o: pivot, dx: rayX, dy: rayY, cuts }, f, rule);
    }
  }
  return sum;
}

function straightPieces(corners: readonly SiPoint[], { partM, pivot }: IntegrationEffort): EdgePiece[] {
  return corners.map((a, i) => {
    const b = corners[(i + 1) % corners.length];
    const [dxM, dyM] = [b.xM - a.xM, b.yM - a.yM];
    const edgeM = Math.hypot(dxM, dyM);
    const heightM = Math.abs((a.xM - pivot.xM) * dyM - (a.yM - pivot.yM) * dxM) / edgeM;
    return {
      parts: partCount(edgeM, Math.max(partM, heightM), MAX_PARTS),
      reachM: Math.max(distanceM(a, pivot), distanceM(b, pivot)),
      at: (t) => ({ xM: a.xM + t * dxM, yM: a.yM + t * dyM, dxM, dyM }),
    };
  });
}

function ellipsePiece(outline: Extract<SiOutline, { kind: 'ellipse' }>, { partM, pivot }: IntegrationEffort): EdgePiece {
  const { centre, widthM, heightM } = outline;
  const sideM = Math.max(widthM, heightM);
  const turn = 2 * Math.PI;
  return {
    parts: Math.max(8, partCount(Math.PI * sideM, partM, MAX_ELLIPSE_PARTS)),
    reachM: sideM / 2 + distanceM(centre, pivot),
    at: (t) => {
      const [cosine, sine] = [Math.cos(turn * t), Math.sin(turn * t)];
      return {
        xM: centre.xM + (widthM / 2) * cosine,
        yM: centre.yM + (heightM / 2) * sine,
        dxM: -turn * (widthM / 2) * sine,
        dyM: turn * (heightM / 2) * cosine,
      };
    },
  };
}

interface Ray {
  readonly o: SiPoint;
  readonly dx: number;
  readonly dy: number;
  readonly cuts: readonly number[];
}

function integrateRay({ o, dx, dy, cuts }: Ray, f: Integrand, rule: QuadratureRule): number {
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

function distanceM(a: SiPoint, b: SiPoint): number {
  return Math.hypot(a.xM - b.xM, a.yM - b.yM);
}

function partCount(lengthM: number, partM: number, most: number): number {
  return Math.min(most, Math.max(1, Math.ceil(lengthM / partM)));
}

/** 0, then from a part's length on doubling up to the whole: fractions of the reach. */
function geometricCuts(reachM: number, partM: number): number[] {
  const cuts = [0];
  for (let at = partM / reachM; at < 0.75; at *= 2) cuts.push(at);
  cuts.push(1);
  return cuts;
}
