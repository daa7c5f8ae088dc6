import type { QualityFinding, QualityVerdict } from '../../../shared/model/cell-family';
import type { MarkState } from '../ui/state-mark';

const MARKS: Readonly<Record<QualityVerdict, MarkState>> = { pass: 'meets', warn: 'stale', fail: 'falls-short', 'not-evaluated': 'not-evaluated' };
const WORDS: Readonly<Record<QualityVerdict, string>> = { pass: 'passes', warn: 'passes with remarks', fail: 'fails', 'not-evaluated': 'not evaluated' };

/** The mark of a quality verdict: the amber hatch stands for what a person must look at. */
export const verdictMark = (verdict: QualityVerdict): MarkState => MARKS[verdict];
export const verdictText = (verdict: QualityVerdict): string => WORDS[verdict];

/** "side-3.4.s1p, line 12": where the numbers of a finding came from; empty where it speaks of no one place. */
export function originText({ file, line }: Pick<QualityFinding, 'file' | 'line'>): string {
  if (file === undefined) return '';
  return line === undefined ? file : `${file}, line ${line}`;
}

/** "passivity" from "passivity", "phase jump" from "phase-jump". */
export const checkText = (check: string): string => check.replaceAll('-', ' ');
