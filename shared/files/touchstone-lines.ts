import type { FileFaults } from './file-faults';
import { quoted } from './file-faults';
import type { FileText } from './file-text';
import type { TouchstoneComment } from './touchstone-data';

/** One line that holds more than a comment, trimmed. */
export interface TouchstoneLine {
  readonly number: number;
  readonly text: string;
}

export interface TouchstoneLines {
  readonly lines: readonly TouchstoneLine[];
  readonly comments: readonly TouchstoneComment[];
}

// Everything but tab and the printable ASCII characters.
const FOREIGN = /[^\t\x20-\x7E]/;
const KEY_VALUE = /^([A-Za-z][\w .()/-]{0,60}?)\s{0,8}[:=]\s{0,8}(\S.*)$/;
/** A row of 64 ports in one line is about 3,300 characters, a whole record about 210,000. */
const LONGEST_LINE = 1_000_000;
const MOST_LINES = 2_000_000;
/** Comments carry a file's description; measured sweeps with a remark on every point need no more than this. */
const MOST_COMMENTS = 2000;

/** Cuts a decoded file into content lines and comments, and reports characters the format does not allow. */
export function splitTouchstoneLines(file: FileText, faults: FileFaults): TouchstoneLines {
  reportEncoding(file, faults);
  const lines: TouchstoneLine[] = [];
  const comments: TouchstoneComment[] = [];
  const rows = withoutEndMark(file.text).split(/\r\n|\n|\r/, MOST_LINES + 1);
  if (rows.length > MOST_LINES) faults.error(MOST_LINES, `The file has more than ${MOST_LINES} lines`);
  rows.forEach((row, index) => {
    const number = index + 1;
    const mark = row.indexOf('!');
    const content = trimBlanks(mark < 0 ? row : row.slice(0, mark));
    if (mark >= 0 && comments.length < MOST_COMMENTS) comments.push(readComment(row.slice(mark + 1), number, faults));
    if (content === '') return;
    if (content.length > LONGEST_LINE) faults.error(number, `The line is longer than ${LONGEST_LINE} characters`);
    else if ((content.startsWith('#') || content.startsWith('[')) && FOREIGN.test(content)) reportForeign(content, number, faults);
    else lines.push({ number, text: content });
  });
  const last = lines[lines.length - 1];
  if (last !== undefined && last.number === rows.length && !/[\r\n]$/.test(file.text) && !/^\[end\]/i.test(last.text))
    faults.notice(last.number, 'The last line has no line end: its last number may be cut short');
  return { lines, comments };
}

/** Leaves out the control-Z with which old systems end a text file. */
function withoutEndMark(text: string): string {
  let end = text.length;
  while (end > 0 && '\u001A\r\n \t'.includes(text[end - 1])) end -= 1;
  return text.slice(0, end);
}

/** Spaces and tabs only: other blanks of Unicode do not separate numbers in this format. */
export function trimBlanks(text: string): string {
  let start = 0;
  let end = text.length;
  while (start < end && isBlank(text, start)) start += 1;
  while (end > start && isBlank(text, end - 1)) end -= 1;
  return text.slice(start, end);
}

function isBlank(text: string, at: number): boolean {
  return text[at] === ' ' || text[at] === '\t';
}

function reportEncoding(file: FileText, faults: FileFaults): void {
  if (file.encoding.startsWith('utf-16'))
    faults.notice(1, `The file is in ${file.encoding.toUpperCase()} and was decoded; the format asks for ASCII`);
  else if (file.hadByteOrderMark) faults.notice(1, 'A byte order mark before the first character was left out');
}

function readComment(text: string, line: number, faults: FileFaults): TouchstoneComment {
  const trimmed = trimBlanks(text);
  if (FOREIGN.test(trimmed))
    faults.warnOnce('foreign-comment', line, { text: `A comment holds characters beyond ASCII: ${quoted(trimmed)}`, suggestion: 'Other readers may refuse the file; the numbers are unaffected' });
  const match = KEY_VALUE.exec(trimmed);
  return match ? { line, text: trimmed, key: match[1], value: match[2] } : { line, text: trimmed };
}

/** Says which character of a content line the format does not know. */
export function reportForeign(content: string, line: number, faults: FileFaults): void {
  const at = content.search(FOREIGN);
  const code = content.charCodeAt(at).toString(16).toUpperCase().padStart(4, '0');
  faults.error(line, `Character U+${code} in ${quoted(content)} is not allowed outside comments`, 'Remove it; data are plain ASCII');
}
