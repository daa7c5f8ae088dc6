import { HttpErrorResponse, HttpResponse, HttpXsrfTokenExtractor } from '@angular/common/http';
import type { HttpInterceptorFn, HttpRequest } from '@angular/common/http';
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

/**
 * Renews the short access cookie when it has run out and sends the call again. When the session is over the call waits
 * until the person has signed in again, so that no work is lost.
 */
export const sessionInterceptor: HttpInterceptorFn = (request, next) => {
  if (OPEN.test(request.url)) return next(request);
  const store = inject(SessionStore);
  const forgeryToken = inject(HttpXsrfTokenExtractor);
  const isOver = (error: unknown): boolean => error instanceof HttpErrorResponse && error.status === 401 && store.current() !== null;
  return next(request).pipe(
    tap((event) => {
      if (event instanceof HttpResponse) store.answered();
    }),
    catchError((error: unknown) => {
      if (!isOver(error)) return throwError(() => error);
      return renewed(store).pipe(
        switchMap((session) => {
          if (session === null) store.lose();
          return store.signedIn();
        }),
        switchMap(() => next(withForgeryToken(request, forgeryToken.getToken()))),
      );
    }),
  );
};

/** A new session has a token of its own; the one that the call carries belongs to the session that is over. */
function withForgeryToken(request: HttpRequest<unknown>, token: string | null): HttpRequest<unknown> {
  if (token === null || !request.headers.has('X-XSRF-TOKEN')) return request;
  return request.clone({ headers: request.headers.set('X-XSRF-TOKEN', token) });
}
