import { commonPasswords } from './common-passwords';

export const MIN_LENGTH = 15;
export const MAX_LENGTH = 256;

/** Words that anyone would try on this product, besides those of the person and the team. */
const productWords = ['slantwise', 'slant', 'panel', 'reflector', 'antenna', 'beam', 'steering'];

const keyboardRuns = ['abcdefghijklmnopqrstuvwxyz', '01234567890', 'qwertyuiopasdfghjklzxcvbnm', 'qazwsxedcrfvtgbyhnujmikolp'];
/** Shorter pieces happen by chance in any sentence. */
const RUN_LENGTH = 4;

const reversed = (text: string): string => [...text].reverse().join('');

/** How many characters at the start go up or down a row of the keyboard, the alphabet or the digits. */
function runAt(text: string): number {
  for (let length = text.length; length >= RUN_LENGTH; length -= 1) {
    const piece = text.slice(0, length);
    const inRun = keyboardRuns.some((run) => `${run}${run}`.includes(piece) || `${reversed(run)}${reversed(run)}`.includes(piece));
    if (inRun) return length;
  }
  return 0;
}

/** True when the text repeats one piece of at most half its length. */
function isRepetition(text: string): boolean {
  return `${text}${text}`.indexOf(text, 1) < text.length;
}

/** Letters people swap for signs; undone before looking words up. */
const swaps: Readonly<Record<string, string>> = { '@': 'a', '4': 'a', '3': 'e', '1': 'i', '!': 'i', '0': 'o', $: 's', '5': 's', '7': 't' };
const withoutSwaps = (text: string): string => [...text].map((mark) => swaps[mark] ?? mark).join('');

const isWord = (piece: string, extraWords: ReadonlySet<string>): boolean =>
  [piece, withoutSwaps(piece)].some((form) => commonPasswords.has(form) || extraWords.has(form));

/**
 * The fewest known pieces (common passwords, known words, keyboard runs, single repeated characters) that make up the
 * whole text, or null when something else is in it. Digits and signs between the pieces add nothing.
 */
function fewestPieces(text: string, extraWords: ReadonlySet<string>): number | null {
  const fewest: (number | null)[] = [0];
  for (let end = 1; end <= text.length; end += 1) {
    fewest[end] = bestEnding(text, end, { fewest, extraWords });
  }
  return fewest[text.length] ?? null;
}

function bestEnding(text: string, end: number, known: { fewest: readonly (number | null)[]; extraWords: ReadonlySet<string> }): number | null {
  let best: number | null = null;
  for (let start = Math.max(0, end - 32); start < end; start += 1) {
    const before = known.fewest[start] ?? null;
    if (before === null) continue;
    const piece = text.slice(start, end);
    const filler = piece.length === 1 && !/\p{L}/u.test(piece);
    const matches = filler || isWord(piece, known.extraWords) || runAt(piece) === piece.length;
    const count = before + (filler ? 0 : 1);
    if (matches && (best === null || count < best)) best = count;
  }
  return best;
}

/** Passphrases of this many words are fine even when each word is common. */
const ENOUGH_WORDS = 4;

/**
 * Why a password cannot be taken; empty when it can. Length and a list of what is guessed first, and no rule about
 * kinds of characters (NIST SP 800-63B-4).
 * @param context words of the person, the address and the team, which a guesser would try
 */
export function passwordFaults(password: string, context: readonly string[]): string[] {
  const length = [...password].length;
  if (length < MIN_LENGTH) return [`must have at least ${MIN_LENGTH} characters; this has ${length}`];
  if (length > MAX_LENGTH) return [`must have at most ${MAX_LENGTH} characters`];
  const text = password.normalize('NFKC').toLowerCase();
  if (new Set(text).size < 5) return ['uses fewer than five different characters'];
  if (isRepetition(text)) return ['repeats the same piece'];
  const own = context.flatMap((entry) => entry.toLowerCase().split(/[^\p{L}\p{N}]+/u)).filter((word) => word.length >= 3);
  const extraWords = new Set([...productWords, ...own]);
  const pieces = fewestPieces(text, extraWords);
  if (pieces !== null && pieces < ENOUGH_WORDS) {
    return ['is made of passwords, names or key sequences that are tried first; add words that have nothing to do with you or this product'];
  }
  return [];
}
