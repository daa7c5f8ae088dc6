interface ResultKey {
  readonly teamId: string;
  readonly contentHash: string;
  readonly kind: string;
  readonly engineVersion: string;
}

interface KeyedRun {
  readonly teamId: string;
  readonly resultKey: string;
  readonly kind: string;
  readonly engineVersion: string;
}

/** Under what the result of a run is kept: equal inputs and equal arithmetic have one result. */
export function resultKeyOf({ teamId, resultKey, kind, engineVersion }: KeyedRun): ResultKey {
  return { teamId, contentHash: resultKey, kind, engineVersion };
}
