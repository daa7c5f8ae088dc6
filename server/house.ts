import type { Ground } from './database/ground';

/** The services of all features, made once per process. A feature reaches another one only through these. */
export interface House extends Ground {
  /** Stops what a service keeps running: pools, timers, servers. Last made, first closed. */
  close(): Promise<void>;
}

export function createHouse(ground: Ground): House {
  const closers: (() => Promise<void>)[] = [];
  return {
    ...ground,
    close: async () => {
      for (const closer of closers.reverse()) await closer();
    },
  };
}
