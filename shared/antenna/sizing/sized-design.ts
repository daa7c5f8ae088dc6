import type { DesignDocument } from '../../model/design-document';
import { radFromDeg } from '../../units/angles';
import { directionOf } from '../../waves/conventions';
import { outlineBounds } from '../outline';
import { siPanel } from '../si-design';
import { sizePanel, type SizingAdvice, type SizingQuery } from './size-panel';

/** What a person chooses besides the requirement. */
export interface SizingWish {
  readonly gainDbi: number;
  readonly allowanceDb: number;
  readonly edgeTaperDb: number;
  readonly focalRatio: number;
}

/** Advice for the requirement, kind of outline, lattice and operation of a design. */
export function sizingAdvice(design: DesignDocument, wish: SizingWish): SizingAdvice {
  return sizePanel(sizingQuery(design, wish));
}

function sizingQuery({ requirement, panel }: DesignDocument, wish: SizingWish): SizingQuery {
  const { leftM, rightM, bottomM, topM } = outlineBounds(siPanel(panel).outline);
  const highestGHz = Math.max(requirement.designFrequencyGHz, ...(requirement.bandGHz ?? []));
  return {
    ...wish,
    designFrequencyHz: requirement.designFrequencyGHz * 1e9,
    highestFrequencyHz: highestGHz * 1e9,
    beams: requirement.beams.map(({ thetaDeg, phiDeg }) => directionOf(radFromDeg(thetaDeg), radFromDeg(phiDeg))),
    aspectRatio: (rightM - leftM) / (topM - bottomM),
    shape: panel.outline.kind === 'ellipse' ? 'ellipse' : 'rectangle',
    lattice: panel.lattice.kind,
    operation: panel.operation,
  };
}

const HEIGHT_OVER_SIDE = Math.sqrt(3) / 2;
const roundedMm = (metres: number, digits: number): number => Number((metres * 1000).toFixed(digits)) + 0;

/**
 * The design with the advice in it: outline, period and horn. A polygon gives way to the rectangle around it, and
 * keep-outs stay. Sides are rounded up to 0.1 mm, so the gain is not lost to rounding.
 */
export function sizedDesign(design: DesignDocument, advice: SizingAdvice): DesignDocument {
  const { panel, illumination } = design;
  const upMm = (metres: number): number => Math.ceil(metres * 1e4 - 1e-6) / 10;
  const size = { widthMm: upMm(advice.widthM), heightMm: upMm(advice.heightM) };
  const periodMm = roundedMm(advice.periodM, 2);
  const exponent = Number(advice.feedExponent.toFixed(2));
  const [x, y, z] = advice.hornPositionM.map((metres) => roundedMm(metres, 1));
  return {
    ...design,
    panel: {
      ...panel,
      outline: panel.outline.kind === 'ellipse' ? { kind: 'ellipse', ...size } : { kind: 'rectangle', ...size },
      lattice:
        panel.lattice.kind === 'triangular'
          ? { kind: 'triangular', periodXMm: periodMm, rowSpacingMm: roundedMm(advice.periodM * HEIGHT_OVER_SIDE, 2) }
          : { kind: 'rectangular', periodXMm: periodMm, periodYMm: periodMm },
    },
    illumination: { kind: 'horn', positionMm: [x, y, z], aimMm: [0, 0, 0], exponentE: exponent, exponentH: exponent, polarisation: illumination.polarisation },
  };
}
