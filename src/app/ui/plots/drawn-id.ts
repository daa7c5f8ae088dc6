let drawn = 0;

/** An id for a clip or a pattern inside a drawing, different for every drawing on the page. */
export function drawnId(what: string): string {
  drawn += 1;
  return `slant-${what}-${drawn}`;
}
