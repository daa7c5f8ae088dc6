import type { Role, Scope } from '../../shared/contracts/common';

/** What a personal token may be given, by role. Every route checks roles besides, so a scope never widens them. */
const scopesByRole: Readonly<Record<Role, readonly Scope[]>> = {
  designer: ['read', 'predict', 'design'],
  lab: ['read', 'predict', 'library'],
  reviewer: ['read', 'predict', 'design'],
  fabricator: ['read', 'predict'],
  range: ['read', 'predict'],
  administrator: ['read', 'predict', 'team'],
};

export function scopesOfRoles(roles: readonly Role[]): Scope[] {
  return [...new Set<Scope>(roles.flatMap((role) => scopesByRole[role]))];
}
