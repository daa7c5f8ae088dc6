import { maskEnvelope, maskFirstDeg, maskLevelDb } from '../../../shared/antenna/masks/mask-envelope';
import type { MaskFacts } from '../../../shared/antenna/masks/mask-segment';
import { firstAngleOfS465Deg, referencePatternOfF699Dbi } from '../../../shared/antenna/masks/published-masks';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';

/** Level of a published envelope; null where it is undefined. */
function levelOf(id: string, facts: Partial<MaskFacts>, offAxisDeg: number): number | null {
  const envelope = maskEnvelope({ kind: 'published', id }, { apertureOverWavelength: 100, frequencyHz: 12e9, peakGainDbi: 45, ...facts });
  if ('reason' in envelope) throw new Error(envelope.reason);
  return maskLevelDb(envelope, offAxisDeg);
}

function compareLevels(check: PublishedCheck, got: readonly (number | null)[]): void {
  const expected = check.expected['gain_dBi'] as (number | null)[];
  expect(got.map((level) => level === null)).toEqual(expected.map((level) => level === null));
  const defined = <T>(levels: readonly (T | null)[]): T[] => levels.filter((level): level is T => level !== null);
  expectWithin({ quantity: 'level', unit: 'dBi', got: defined(got), expected: defined(expected), tolerance: toleranceOf(check, 'dB') });
}

export const maskChecks: CheckTable = {
  'mask-01': (check) => {
    const cases = check.inputs['cases'] as { D_over_lambda: number; phi_deg: number }[];
    compareLevels(check, cases.map(({ D_over_lambda: apertureOverWavelength, phi_deg: phi }) => levelOf('itu-r-s465-6', { apertureOverWavelength }, phi)));
    const firsts = Object.entries(check.expected['phi_min_deg'] as Record<string, number>);
    const got = firsts.map(([ratio]) => firstAngleOfS465Deg(Number(ratio)));
    expectWithin({ quantity: 'first angle', unit: 'deg', got, expected: firsts.map(([, first]) => first), tolerance: toleranceOf(check, 'deg') });
    const envelope = maskEnvelope({ kind: 'published', id: 'itu-r-s465-6' }, { apertureOverWavelength: 40, frequencyHz: 12e9, peakGainDbi: 40 });
    expect('reason' in envelope ? NaN : maskFirstDeg(envelope)).toBe(firstAngleOfS465Deg(40));
  },
  'mask-02': (check) => {
    const apertureOverWavelength = numberIn(check.inputs, 'D_over_lambda');
    compareLevels(check, numbersIn(check.inputs, 'phi_deg').map((phi) => levelOf('itu-r-s580-6', { apertureOverWavelength }, phi)));
  },
  'mask-03': (check) => {
    const apertureOverWavelength = numberIn(check.inputs, 'D_over_lambda');
    const facts = { apertureOverWavelength, peakGainDbi: 20 * Math.log10(apertureOverWavelength) + 7.7 };
    const angles = numbersIn(check.inputs, 'phi_deg');
    compareLevels(check, angles.map((phi) => referencePatternOfF699Dbi(facts, phi)));
    // What is judged is the same pattern, from the end of the main lobe on.
    for (const phi of angles) {
      const judged = levelOf('itu-r-f699-8', facts, phi);
      if (judged !== null) expect(judged).toBeCloseTo(referencePatternOfF699Dbi(facts, phi), 12);
    }
  },
  'mask-04': (check) => compareLevels(check, numbersIn(check.inputs, 'theta_deg').map((theta) => levelOf('fcc-25-209-a1', { frequencyHz: 6e9 }, theta))),
  'mask-05': (check) => compareLevels(check, numbersIn(check.inputs, 'theta_deg').map((theta) => levelOf('fcc-25-209-a2', { frequencyHz: 14.25e9 }, theta))),
};
