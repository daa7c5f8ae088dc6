import { gaussLegendre } from '../../math/quadrature';

/** Nodes beyond what the size of the panel asks for. */
const SPARE_NODES = 16;
const RULE_STEP = 32;

/** Power at (v, w) of a line of constant u, in front of the panel. */
export type PowerLine = (v: number, w: number) => number;

/** Largest phase, in rad, that two cells can differ by along x and y: k times the sides of the panel. */
export interface PatternReach {
  readonly alongX: number;
  readonly alongY: number;
}

/**
 * Integral of a power pattern over the outward hemisphere, where no kernel is known in closed form. With u = sin alpha and
 * v = cos alpha sin beta the area is dOmega = du dv / cos theta = cos alpha dalpha dbeta: no singular rim is left, and each alpha is one
 * line of constant u. |field|^2 holds nothing faster than exp(j reach sin alpha), which Gauss's rule over half a turn follows from
 * reach pi/4 nodes on.
 */
export function hemispherePower(lineAt: (u: number) => PowerLine, { alongX, alongY }: PatternReach): number {
  const outer = gaussLegendre(Math.ceil((alongX * Math.PI) / 4) + SPARE_NODES);
  let total = 0;
  for (let i = 0; i < outer.nodes.length; i++) {
    const alpha = (Math.PI / 2) * outer.nodes[i];
    const cosine = Math.cos(alpha);
    // Few sizes of rule, since each is worked out once and kept.
    const inner = gaussLegendre(RULE_STEP * Math.ceil(((alongY * cosine * Math.PI) / 4 + SPARE_NODES) / RULE_STEP));
    const line = lineAt(Math.sin(alpha));
    let sum = 0;
    for (let j = 0; j < inner.nodes.length; j++) {
      const beta = (Math.PI / 2) * inner.nodes[j];
      sum += inner.weights[j] * line(cosine * Math.sin(beta), cosine * Math.cos(beta));
    }
    total += outer.weights[i] * cosine * sum;
  }
  return total * (Math.PI / 2) ** 2;
}
