import type { Readable } from 'node:stream';

/** More numbers than this are not written as JSON: 20 bytes each, and seconds to write and to read. */
export const MAX_JSON_NUMBERS = 2_500_000;

export interface CookieChange {
  readonly name: string;
  /** Null removes the cookie. */
  readonly value: string | null;
  readonly path: string;
  readonly httpOnly: boolean;
  readonly secure: boolean;
  readonly maxAgeSeconds: number;
}

export interface ReplyOptions {
  readonly status?: number;
  /** Strong entity tag with its quotes: see `etag.ts`. */
  readonly etag?: string;
  /** Address of what was created; goes with 201 and 202. */
  readonly location?: string;
  readonly cookies?: readonly CookieChange[];
  readonly headers?: Readonly<Record<string, string>>;
}

/** A JSON body with more than the body to say. A handler without such needs returns the plain value. */
export class Reply<T> {
  constructor(
    readonly body: T,
    readonly options: ReplyOptions = {},
  ) {}
}

/** Bytes or a stream. With `fileName` it is offered as a download and never rendered. */
export class BytesReply {
  constructor(
    readonly body: Uint8Array | Readable,
    readonly contentType: string,
    readonly options: ReplyOptions & { readonly fileName?: string } = {},
  ) {}
}
