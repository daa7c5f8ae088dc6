import { inject } from '@angular/core';
import type { CanActivateFn } from '@angular/router';
import { Router } from '@angular/router';
import { SessionStore } from './session-store';

/** Sends strangers to the sign-in page, which brings them back to where they wanted to go. */
export const signedInOnly: CanActivateFn = (_route, state) => {
  if (inject(SessionStore).current() !== null) return true;
  return inject(Router).createUrlTree(['/sign-in'], { queryParams: state.url === '/' ? {} : { to: state.url } });
};
