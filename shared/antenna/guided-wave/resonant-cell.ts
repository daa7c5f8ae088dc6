/**
 * A resonant cell on a guided wave couples alpha = (j + exp(j psi)) / 2 = sin(zeta) exp(j zeta), zeta = (psi + 90 deg) / 2 in
 * (0, 180 deg): with exp(+j omega t) a resonance 1 / (delta + j) runs round the circle about -j/2, and the -1 is common to
 * all cells. Strength and phase are tied, so a wanted phase can be served in more than one way.
 */
export type ResonantRule =
  /** psi = target: the most field in the beam. */
  | 'projection'
  /** The point of the circle nearest to exp(j target). */
  | 'nearest'
  /** The right phase where the circle has it (0 to 180 deg), off elsewhere. */
  | 'phase-only';

export interface CoupledField {
  magnitude: number;
  phaseRad: number;
}

/** Field of a cell tuned to psi, written into `out`. */
export function coupledField(psiRad: number, out: CoupledField): CoupledField {
  const zeta = (psiRad + Math.PI / 2) / 2;
  const sine = Math.sin(zeta);
  out.magnitude = Math.abs(sine);
  out.phaseRad = sine < 0 ? zeta + Math.PI : zeta;
  return out;
}

/** What a continuously tuned cell gives for a target, written into `out`. */
export function tunedField(rule: ResonantRule, targetRad: number, out: CoupledField): CoupledField {
  if (rule === 'projection') return coupledField(targetRad, out);
  if (rule === 'nearest') return coupledField(Math.atan2(Math.sin(targetRad) - 0.5, Math.cos(targetRad)), out);
  const zeta = targetRad - 2 * Math.PI * Math.floor(targetRad / (2 * Math.PI));
  out.magnitude = zeta < Math.PI ? Math.sin(zeta) : 0;
  out.phaseRad = zeta;
  return out;
}

/** Index of the best of the states psi = 360 k / K: the largest in-phase part, or the nearest point. Ties to the smallest. */
export function bestState(rule: Exclude<ResonantRule, 'phase-only'>, targetRad: number, states: number): number {
  // Re(alpha exp(-j target)) = (sin(target) + cos(psi - target)) / 2 and |alpha - exp(j target)| is least where psi is nearest
  // to the direction of exp(j target) - j/2: both choose the state nearest to one angle.
  const wanted = rule === 'projection' ? targetRad : Math.atan2(Math.sin(targetRad) - 0.5, Math.cos(targetRad));
  const place = (wanted / (2 * Math.PI)) * states;
  // Half way between two states counts as the lower one, rounding aside.
  const nearest = Math.ceil(place - 0.5 - 1e-9);
  return nearest - states * Math.floor(nearest / states);
}

export interface RuleAverages {
  /** Mean of Re(alpha exp(-j target)) over targets spread evenly round the circle. */
  readonly meanInPhase: number;
  /** |mean|^2 over mean |alpha|^2: the share of what the cells couple that goes into the beam. */
  readonly modulationEfficiency: number;
}

const AVERAGED = 7200;

/** What a rule gives on the average over all target phases, by the midpoint rule (of a periodic function, so nearly exact). */
export function ruleAverages(rule: ResonantRule, states: number | null): RuleAverages {
  const field: CoupledField = { magnitude: 0, phaseRad: 0 };
  let [inPhase, quadrature, power] = [0, 0, 0];
  for (let i = 0; i < AVERAGED; i++) {
    const target = (2 * Math.PI * (i + 0.5)) / AVERAGED;
    chosenField({ rule, states }, target, field);
    inPhase += field.magnitude * Math.cos(field.phaseRad - target);
    quadrature += field.magnitude * Math.sin(field.phaseRad - target);
    power += field.magnitude * field.magnitude;
  }
  return { meanInPhase: inPhase / AVERAGED, modulationEfficiency: (inPhase * inPhase + quadrature * quadrature) / (AVERAGED * power) };
}

export interface ResonantChoice {
  readonly rule: ResonantRule;
  /** Number of states, or null for a continuous tuning. */
  readonly states: number | null;
}

/** Writes the field into `out` and answers the state, -1 where the tuning is continuous. */
export function chosenField({ rule, states }: ResonantChoice, targetRad: number, out: CoupledField): number {
  if (states === null || rule === 'phase-only') {
    tunedField(rule, targetRad, out);
    return -1;
  }
  const k = bestState(rule, targetRad, states);
  coupledField((2 * Math.PI * k) / states, out);
  return k;
}
