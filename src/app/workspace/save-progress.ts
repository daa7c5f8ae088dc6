/** What the bar says about the draft's way to the server. Times are epoch milliseconds of the browser's clock. */
export type SaveProgress =
  | { readonly kind: 'saved'; readonly at: number }
  | { readonly kind: 'saving' }
  /** Kept in this browser; sending starts again by itself. */
  | { readonly kind: 'offline'; readonly since: number }
  /** Somebody else saved the draft meanwhile; nothing is sent until a person decides. */
  | { readonly kind: 'conflict' }
  /** The server refused the draft; `faults` say where. */
  | { readonly kind: 'not-valid'; readonly detail: string; readonly faults: readonly DraftFault[] }
  | { readonly kind: 'view-only' };

export interface DraftFault {
  /** JSON pointer into the design document. */
  readonly pointer: string;
  readonly detail: string;
}
