import { HttpErrorResponse, HttpResponse } from '@angular/common/http';
import type { HttpInterceptorFn } from '@angular/common/http';
import { inject } from '@angular/core';
import { catchError, defer, finalize, from, shareReplay, switchMap, tap, throwError } from 'rxjs';
import type { Observable } from 'rxjs';
import { SessionStore } from './session-store';

/** One renewal at a time, however many calls wait for it. */
let renewal: Observable<unknown> | null = null;

function renewed(store: SessionStore): Observable<unknown> {
  renewal ??= defer(() => from(store.refresh())).pipe(
    finalize(() => {
      renewal = null;
    }),
    shareReplay(1),
  );
  return renewal;
}

/** Calls whose 401 is an answer and no ended session. */
const OPEN = /^\/api\/(about$|session$|session\/refresh$|password-resets|invitations)/;

/** Renews the short access cookie when it has run out and sends the call again; a session that is over is told to the store. */
export const sessionInterceptor: HttpInterceptorFn = (request, next) => {
  const store = inject(SessionStore);
  if (OPEN.test(request.url)) return next(request);
  return next(request).pipe(
    tap((event) => {
      if (event instanceof HttpResponse) store.answered();
    }),
    catchError((error: unknown) => {
      if (!(error instanceof HttpErrorResponse) || error.status !== 401) return throwError(() => error);
      return renewed(store).pipe(
        switchMap((session) => {
          if (session !== null) return next(request);
          store.lose();
          return throwError(() => error);
        }),
      );
    }),
  );
};
