import { placeCells } from '../../../shared/antenna/place-cells';
import { illuminatedState } from '../../../shared/antenna/illuminated-state';
import { focusFigures } from '../../../shared/antenna/synthesis/focus-figures';
import { expectWithin } from '../expect-within';
import { numberIn, numbersIn, toleranceOf, type CheckTable, type PublishedCheck } from '../published-check';
import { numberOf } from '../test-arrays';
import { hornAt, testDesign } from '../test-designs';

/** The real maximum on the axis of a focused panel, from the document to the figure. */
function compareFocus(check: PublishedCheck): void {
  const { inputs, expected } = check;
  const height = inputs['feed_height_mm'];
  const design = testDesign({
    frequencyGHz: numberIn(inputs, 'f_GHz'),
    periodMm: numberIn(inputs, 'period_mm'),
    columns: numberIn(inputs, 'nx'),
    rows: numberIn(inputs, 'ny'),
    ...(typeof height === 'number' ? { illumination: hornAt([0, 0, height], numberIn(inputs, 'q')) } : {}),
    synthesis: { kind: 'focus', pointMm: [0, 0, numberIn(inputs, 'focus_z_mm')] },
    radiateExponent: numberIn(inputs, 'radiate_exponent'),
  });
  const found = focusFigures(illuminatedState(placeCells(design)), { xM: 0, yM: 0, zM: numberIn(inputs, 'focus_z_mm') / 1000 });
  if ('kind' in found) throw new Error(found.reason);
  const tolerance = toleranceOf(check, 'mm');
  expectWithin({ quantity: 'maximum on the axis', unit: 'mm', got: found.maximumMm, expected: numberIn(expected, 'z_max_mm'), tolerance });
  expectWithin({ quantity: 'rise over the focus', unit: 'dB', got: found.riseDb, expected: numberIn(expected, 'level_max_rel_zf_dB'), tolerance: toleranceOf(check, 'dB') });
  const half = [numberOf(found.halfPowerMm.from), numberOf(found.halfPowerMm.to)];
  expectWithin({ quantity: 'half power', unit: 'mm', got: half, expected: numbersIn(expected, 'half_power_z_mm'), tolerance });
}

export const synthesisChecks: CheckTable = {
  'foc-01': compareFocus,
  'foc-02': compareFocus,
};
