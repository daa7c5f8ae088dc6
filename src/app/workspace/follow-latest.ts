import { Observable } from 'rxjs';
import type { ObservableInput, OperatorFunction, Subscription } from 'rxjs';
import { from } from 'rxjs';

/**
 * Runs `project` for the latest value only, one at a time. A newer value waits while the running work is younger than
 * `patienceMs`, and then replaces it. Plain switchMap starves during a drag whose moves come faster than the answers;
 * plain exhaustMap keeps a person waiting for slow work that nobody wants any more.
 */
export function followLatest<T, R>(project: (value: T) => ObservableInput<R>, patienceMs: number): OperatorFunction<T, R> {
  return (source) =>
    new Observable<R>((subscriber) => {
      let running: Subscription | null = null;
      let next: { readonly value: T } | null = null;
      let startedAt = 0;
      let impatience: ReturnType<typeof setTimeout> | null = null;
      let sourceEnded = false;

      const forgetImpatience = (): void => {
        if (impatience !== null) clearTimeout(impatience);
        impatience = null;
      };
      const endWork = (): void => {
        running = null;
        forgetImpatience();
        if (next) startNext();
        else if (sourceEnded) subscriber.complete();
      };
      const startNext = (): void => {
        if (!next) return;
        const { value } = next;
        next = null;
        forgetImpatience();
        running?.unsubscribe();
        startedAt = Date.now();
        let ended = false;
        const work = from(project(value)).subscribe({
          next: (result) => subscriber.next(result),
          error: (error: unknown) => subscriber.error(error),
          complete: () => {
            ended = true;
            endWork();
          },
        });
        if (!ended) running = work;
      };

      const sourceSubscription = source.subscribe({
        next: (value) => {
          next = { value };
          if (!running) startNext();
          else impatience ??= setTimeout(startNext, Math.max(0, startedAt + patienceMs - Date.now()));
        },
        error: (error: unknown) => subscriber.error(error),
        complete: () => {
          sourceEnded = true;
          if (!running && !next) subscriber.complete();
        },
      });
      return () => {
        sourceSubscription.unsubscribe();
        running?.unsubscribe();
        forgetImpatience();
      };
    });
}
