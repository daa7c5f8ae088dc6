import type { Figure, Warning } from '../model/figures';
import { dbToPowerRatio, powerRatioToDb } from '../units/decibels';
import { keepOutShare } from './keep-out-share';
import { isNumber } from './no-figure';
import type { SiDesign } from './si-design';

/** Less than the last digit of a gain that is shown. */
const LEAST_DB = 0.0005;
/** From here on the figures are off by more than a tenth of a decibel's half. */
const WARN_DB = 0.05;

/**
 * Spillover is the share of the horn's power that hits the outline, keep-outs included. What hits a keep-out reaches no cell, so
 * spillover and gain are that much too high; how much is said here.
 */
export function keepOutWarning({ illumination, panel }: SiDesign, spilloverDb: Figure): Warning[] {
  if (illumination.kind !== 'horn' || !isNumber(spilloverDb)) return [];
  const share = keepOutShare(illumination, panel) / dbToPowerRatio(spilloverDb);
  const costDb = -powerRatioToDb(Math.max(1e-12, 1 - share));
  if (costDb < LEAST_DB) return [];
  return [
    {
      code: 'keep-out-power',
      pointer: '#/panel/keepOuts',
      severity: costDb < WARN_DB ? 'note' : 'warn',
      message: `Keep-outs take ${(100 * share).toFixed(2)} % of the power that hits the outline, ${costDb.toFixed(3)} dB. Spillover and gain count it as hitting the panel, so both are that much too high.`,
      numbers: { share, costDb },
    },
  ];
}
