import type { CellIllumination } from './illumination';
import type { PreparedEdition } from './prepare-edition';

/** A designer steers one panel, seldom beside another. */
const PANELS_KEPT = 2;

type Incidence = Pick<CellIllumination, 'incidenceRad' | 'azimuthRad'>;

interface Kept<T> {
  readonly key: string;
  readonly light: Incidence;
  readonly value: T;
}

/** What was reckoned of the panels used last, for each edition at hand; it goes with its edition. */
export type EditionKeeper<T> = (edition: PreparedEdition, key: string, light: Incidence, make: () => T) => T;

/**
 * Keeps what depends on the angles of incidence, number by number the same, and on whatever the caller names in `key`, but
 * not on the wanted beam: while only the beam moves, nothing of it is reckoned twice.
 */
export function editionKeeper<T>(): EditionKeeper<T> {
  const byEdition = new WeakMap<PreparedEdition, Kept<T>[]>();
  return (edition, key, light, make) => {
    const known = byEdition.get(edition) ?? [];
    const found = known.find((kept) => kept.key === key && isSameLight(kept.light, light)) ?? { key, light, value: make() };
    byEdition.set(edition, [found, ...known.filter((kept) => kept !== found)].slice(0, PANELS_KEPT));
    return found.value;
  };
}

function isSameLight(one: Incidence, other: Incidence): boolean {
  return isSame(one.incidenceRad, other.incidenceRad) && isSame(one.azimuthRad, other.azimuthRad);
}

const isSame = (one: Float64Array, other: Float64Array): boolean => one.length === other.length && one.every((value, i) => Object.is(value, other[i]));
