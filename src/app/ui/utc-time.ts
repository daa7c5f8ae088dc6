import { Pipe } from '@angular/core';
import type { PipeTransform } from '@angular/core';

type Fineness = 'day' | 'minute' | 'second';

const LENGTHS: Readonly<Record<Fineness, number>> = { day: 10, minute: 16, second: 19 };

/** "2026-12-01 14:02 UTC": every time on a screen is UTC and says so, as on the drawings and in the files. A day alone is the UTC day. */
export function utcTimeText(isoTime: string, fineness: Fineness = 'minute'): string {
  const text = new Date(isoTime).toISOString().slice(0, LENGTHS[fineness]).replace('T', ' ');
  return fineness === 'day' ? text : `${text}\u00a0UTC`;
}

@Pipe({ name: 'utcTime' })
export class UtcTime implements PipeTransform {
  transform = utcTimeText;
}
