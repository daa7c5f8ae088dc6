import { inject } from '@angular/core';
import type { CanActivateFn } from '@angular/router';
import { RedirectCommand, Router } from '@angular/router';
import type { Role } from '../../../shared/contracts/common';
import { SessionStore } from './session-store';

/** Shows why instead of the sheet when the person has none of the roles; the address bar is left alone. */
export const roleOnly =
  (...roles: readonly Role[]): CanActivateFn =>
  () => {
    if (inject(SessionStore).hasRole(...roles)) return true;
    const reason = inject(Router).createUrlTree(['/not-for-you'], { queryParams: { roles: roles.join(',') } });
    return new RedirectCommand(reason, { skipLocationChange: true });
  };
