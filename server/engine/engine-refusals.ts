/** Why the engine gives no prediction though the design may be sound. */
export class EngineRefusal extends Error {
  constructor(
    readonly kind: 'superseded' | 'abandoned' | 'busy' | 'too-costly' | 'timed-out',
    message: string,
  ) {
    super(message);
    this.name = 'EngineRefusal';
  }
}

export const superseded = (): EngineRefusal => new EngineRefusal('superseded', 'A newer preview of the same name took its place.');
export const abandoned = (): EngineRefusal => new EngineRefusal('abandoned', 'The caller went away.');
