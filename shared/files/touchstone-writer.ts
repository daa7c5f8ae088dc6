/** What is written: S-parameters with real reference resistances. */
export interface TouchstoneDocument {
  readonly portCount: number;
  /** Strictly increasing. */
  readonly frequenciesHz: Float64Array;
  /** S as re, im pairs in the order [frequency][row][column]. */
  readonly values: Float64Array;
  /** One resistance per port; one written value when they are equal. */
  readonly referenceOhm: readonly number[];
  readonly comments: readonly { readonly key: string; readonly value: string }[];
}

/** Version 1 allows four complex pairs on a line. */
const PAIRS_PER_LINE = 4;

/**
 * Writes the dialect that every reader knows: version 1, `# Hz S RI R`, LF, shortest decimals that read back to the same number.
 * Unequal references need the list of version 1.1. Inverse: `readTouchstone`. Throws on numbers the format cannot hold.
 */
export function writeTouchstone(document: TouchstoneDocument): string {
  checkDocument(document);
  const { portCount, frequenciesHz, values, referenceOhm, comments } = document;
  const lines = comments.map(({ key, value }) => `! ${asciiComment(key)}: ${asciiComment(value)}`);
  const isEqual = referenceOhm.every((ohm) => ohm === referenceOhm[0]);
  lines.push(`# Hz S RI R ${(isEqual ? referenceOhm.slice(0, 1) : referenceOhm).join(' ')}`);
  const width = 2 * portCount ** 2;
  frequenciesHz.forEach((frequencyHz, i) => {
    lines.push(...recordLines(frequencyHz, values.subarray(i * width, (i + 1) * width), portCount));
  });
  return `${lines.join('\n')}\n`;
}

function recordLines(frequencyHz: number, terms: Float64Array, portCount: number): string[] {
  // Version 1 writes two ports column by column: S11 S21 S12 S22.
  if (portCount === 2) return [[frequencyHz, ...[0, 2, 1, 3].flatMap((term) => [terms[2 * term], terms[2 * term + 1]])].join(' ')];
  const lines: string[] = [];
  for (let row = 0; row < portCount; row++) {
    const pairs = Array.from(terms.subarray(2 * row * portCount, 2 * (row + 1) * portCount));
    for (let at = 0; at < pairs.length; at += 2 * PAIRS_PER_LINE) lines.push(pairs.slice(at, at + 2 * PAIRS_PER_LINE).join(' '));
  }
  lines[0] = `${frequencyHz} ${lines[0]}`;
  return lines;
}

function checkDocument({ portCount, frequenciesHz, values, referenceOhm }: TouchstoneDocument): void {
  if (!Number.isInteger(portCount) || portCount < 1) throw new RangeError(`A network has one port or more; got ${portCount}`);
  if (values.length !== frequenciesHz.length * 2 * portCount ** 2)
    throw new RangeError(`${frequenciesHz.length} frequencies of ${portCount} port(s) take ${frequenciesHz.length * 2 * portCount ** 2} numbers; got ${values.length}`);
  if (referenceOhm.length !== portCount || !referenceOhm.every((ohm) => ohm > 0 && Number.isFinite(ohm)))
    throw new RangeError(`Each of ${portCount} port(s) takes a positive resistance; got ${referenceOhm.join(', ')}`);
  if (!values.every(Number.isFinite)) throw new RangeError('Every term must be a finite number');
  frequenciesHz.forEach((frequencyHz, i) => {
    const isRising = i === 0 ? frequencyHz >= 0 : frequencyHz > frequenciesHz[i - 1];
    if (!isRising || !Number.isFinite(frequencyHz)) throw new RangeError(`Frequencies must rise from 0 up; got ${frequencyHz} Hz at place ${i}`);
  });
}

const ASCII_FOR: Readonly<Record<string, string>> = { '°': 'deg', µ: 'u', μ: 'u', '–': '-', '—': '-', '−': '-', ε: 'eps', η: 'eta', θ: 'theta', φ: 'phi', Γ: 'Gamma' };

/** A comment in seven bits on one line; what has no ASCII form becomes a question mark. */
function asciiComment(text: string): string {
  return Array.from(text.replace(/\s+/g, ' ').trim(), (character) => (/[\x20-\x7E]/.test(character) ? character : (ASCII_FOR[character] ?? '?'))).join('');
}
