import { DestroyRef, effect, inject, signal, untracked } from '@angular/core';
import type { WritableSignal } from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { ActivatedRoute, Router } from '@angular/router';
import type { ParamMap, Params } from '@angular/router';

/** A drag changes the view many times a second; the address follows when it rests. */
const REST_MS = 250;

/**
 * View state that lives in the address: read from it at first and on back and forward, written to it when it rests.
 * `read` and `write` are inverse to each other; parts that are as at first are null and leave the address. Call in a constructor or field.
 */
export function queryLink<T>(read: (query: ParamMap) => T, write: (state: T) => Params): WritableSignal<T> {
  const route = inject(ActivatedRoute);
  const router = inject(Router);
  const state = signal(read(route.snapshot.queryParamMap));
  /** What the address is known to say. An echo of our own writing must not undo what changed since. */
  let inAddress = write(untracked(state));
  let timer: ReturnType<typeof setTimeout> | undefined;

  route.queryParamMap.pipe(takeUntilDestroyed()).subscribe((query) => {
    const wanted = read(query);
    if (sameParams(write(wanted), inAddress)) return;
    inAddress = write(wanted);
    state.set(wanted);
  });
  effect(() => {
    const queryParams = write(state());
    clearTimeout(timer);
    timer = setTimeout(() => {
      if (sameParams(queryParams, inAddress)) return;
      inAddress = queryParams;
      void router.navigate([], { relativeTo: route, queryParams, queryParamsHandling: 'merge', replaceUrl: true });
    }, REST_MS);
  });
  inject(DestroyRef).onDestroy(() => clearTimeout(timer));
  return state;
}

function sameParams(one: Params, other: Params): boolean {
  return Object.keys({ ...one, ...other }).every((key) => (one[key] ?? null) === (other[key] ?? null));
}
