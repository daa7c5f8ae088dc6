/** Complex numbers as pairs. */
export type Complex = readonly [re: number, im: number];

/** Cells in use with their complex responses at one frequency. */
export interface CellsInUse {
  readonly magnitude: Float64Array;
  readonly phaseRad: Float64Array;
  readonly amplitude: Float64Array;
}

/**
 * Mean response weighted by the power that falls on the cells: the part that all share radiates as the mirror image of the
 * feed, whatever the phases between. Its square is the specular level against a metal plate.
 */
export function meanResponse({ magnitude, phaseRad, amplitude }: CellsInUse): Complex {
  let [re, im, weight] = [0, 0, 0];
  for (let n = 0; n < magnitude.length; n++) {
    const power = amplitude[n] * amplitude[n];
    re += power * magnitude[n] * Math.cos(phaseRad[n]);
    im += power * magnitude[n] * Math.sin(phaseRad[n]);
    weight += power;
  }
  return weight > 0 ? [re / weight, im / weight] : [0, 0];
}

export interface StateChoice {
  readonly phaseRad: number;
  /** Share of target phases, spread evenly round the circle, that choose this state. */
  readonly share: number;
  /** Mean of the state's field towards the target over those phases, Re and Im. */
  readonly beam: Complex;
}

/** What nearest-phase choice makes of a few states on a dense panel: the shares, and with them beam and specular part. */
export function stateChoices(statesRad: readonly number[]): StateChoice[] {
  const turn = 2 * Math.PI;
  const sorted = statesRad.map((rad) => rad - turn * Math.floor(rad / turn)).sort((a, b) => a - b);
  return sorted.map((phaseRad, i) => {
    const before = i > 0 ? sorted[i - 1] : sorted[sorted.length - 1] - turn;
    const after = i + 1 < sorted.length ? sorted[i + 1] : sorted[0] + turn;
    const [from, to] = [(before - phaseRad) / 2, (after - phaseRad) / 2];
    // The integral of exp(-j e) over errors e = target - state of the run that chooses it.
    return { phaseRad, share: (to - from) / turn, beam: [(Math.sin(to) - Math.sin(from)) / turn, (Math.cos(to) - Math.cos(from)) / turn] };
  });
}

/** Levels of a dense panel of such states against ideal cells and against a metal plate, as fields. */
export function denseLevels(statesRad: readonly number[]): { readonly beam: number; readonly specular: number } {
  const choices = stateChoices(statesRad);
  const sum = (part: (choice: StateChoice) => Complex): number => Math.hypot(...choices.map(part).reduce<[number, number]>(([a, b], [re, im]) => [a + re, b + im], [0, 0]));
  return { beam: sum(({ beam }) => beam), specular: sum(({ share, phaseRad }) => [share * Math.cos(phaseRad), share * Math.sin(phaseRad)]) };
}
