/**
 * Errors typed by cause. Services throw them; `problem-reply.ts` turns each into RFC 9457 problem+json in one place.
 * A new cause is one class here and one line in the table there.
 */

export interface Fault {
  /** `#/panel/lattice/periodXMm` into the body, or the name of a parameter. */
  readonly pointer: string;
  readonly detail: string;
}

export type Cause =
  | 'bad-request'
  | 'invalid-input'
  | 'not-signed-in'
  | 'not-allowed'
  | 'not-found'
  | 'method-not-allowed'
  | 'conflict'
  | 'superseded'
  | 'stale-version'
  | 'version-required'
  | 'too-large'
  | 'too-slow'
  | 'unsupported-type'
  | 'not-acceptable'
  | 'too-many'
  | 'unavailable';

/** Base of everything a caller may be told. Any other error is a fault of ours and answers 500 without detail. */
export abstract class Problem extends Error {
  abstract readonly kind: Cause;
  constructor(detail: string) {
    super(detail);
    this.name = new.target.name;
  }
}

/** The request cannot be read at all: broken JSON, broken percent encoding. */
export class BadRequest extends Problem {
  readonly kind = 'bad-request';
}

/** Readable but not valid; names every fault at once. */
export class InvalidInput extends Problem {
  readonly kind = 'invalid-input';
  constructor(readonly faults: readonly Fault[]) {
    super(faults.length === 1 ? '1 value is not valid.' : `${faults.length} values are not valid.`);
  }
}

export class NotSignedIn extends Problem {
  readonly kind = 'not-signed-in';
  constructor(detail = 'Sign in, or send a personal token.') {
    super(detail);
  }
}

/** Known caller, but role, scope or duty forbids it. For objects of another team throw NotFound instead. */
export class NotAllowed extends Problem {
  readonly kind = 'not-allowed';
}

/** Not there, or not yours: the same answer, so that nobody learns which. */
export class NotFound extends Problem {
  readonly kind = 'not-found';
  constructor(noun = 'page') {
    super(`There is no such ${noun}.`);
  }
}

export class MethodNotAllowed extends Problem {
  readonly kind = 'method-not-allowed';
  constructor(readonly allowed: readonly string[]) {
    super(`Only ${allowed.join(', ')} works here.`);
  }
}

/** The state of the object forbids it now: already released, address already taken. */
export class Conflict extends Problem {
  readonly kind = 'conflict';
}

/** A newer request of the same kind took the place of this one before it was answered. */
export class Superseded extends Problem {
  readonly kind = 'superseded';
}

/** If-Match named a version that is no longer the current one. */
export class StaleVersion extends Problem {
  readonly kind = 'stale-version';
  /**
   * @param current strong entity tag of the stored version, with its quotes
   * @param body the stored version itself, where the caller may want to compare: `current` of the answer
   */
  constructor(
    readonly current: string,
    readonly body?: unknown,
  ) {
    super('Someone changed it since you read it. Read it again, then decide.');
  }
}

export class VersionRequired extends Problem {
  readonly kind = 'version-required';
  constructor() {
    super('Send If-Match with the ETag of the version you read.');
  }
}

export class TooLarge extends Problem {
  readonly kind = 'too-large';
}

/** The body did not come within the time that its address allows. */
export class RequestTooSlow extends Problem {
  readonly kind = 'too-slow';
  constructor(limitSeconds: number) {
    super(`The request did not arrive within ${limitSeconds} s.`);
  }
}

export class UnsupportedType extends Problem {
  readonly kind = 'unsupported-type';
  constructor(readonly accepted: readonly string[]) {
    super(`Send the body as ${accepted.join(' or ')}.`);
  }
}

export class NotAcceptable extends Problem {
  readonly kind = 'not-acceptable';
}

export class TooMany extends Problem {
  readonly kind = 'too-many';
  constructor(
    readonly retryAfterSeconds: number,
    detail = 'Too many requests.',
  ) {
    super(`${detail} Try again in ${retryAfterSeconds} s.`);
  }
}

/** A part the answer needs is missing for the moment: database, pool, queue. */
export class Unavailable extends Problem {
  readonly kind = 'unavailable';
  constructor(
    detail: string,
    readonly retryAfterSeconds = 5,
  ) {
    super(detail);
  }
}
