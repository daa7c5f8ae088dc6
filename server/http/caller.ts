import type { Role, Scope } from '../../shared/contracts/common';

/** Who sends a request, read from the database anew for each one: a changed role acts at once. */
export interface Caller {
  readonly person: { readonly id: string; readonly name: string; readonly email: string };
  readonly teamId: string;
  readonly roles: readonly Role[];
  /** Null when a personal token speaks. */
  readonly sessionId: string | null;
  /** What the token may do; null for a session, which is not narrowed. */
  readonly tokenScopes: readonly Scope[] | null;
}

export const hasRole = (caller: Pick<Caller, 'roles'>, ...wanted: readonly Role[]): boolean =>
  wanted.some((role) => caller.roles.includes(role));
