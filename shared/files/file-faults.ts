import type { FileMessage, FileSeverity } from './file-message';

/** Enough to see the pattern of a damaged file; the rest is counted. */
const MOST_MESSAGES = 50;

/** Gathers what a reader has to say about one file: every fault, up to a bound, in the order of the lines. */
export class FileFaults {
  private readonly kept: FileMessage[] = [];
  private readonly seen = new Map<string, number>();
  private errors = 0;
  private unlisted = 0;

  constructor(private readonly most = MOST_MESSAGES) {}

  get hasErrors(): boolean {
    return this.errors > 0;
  }

  error(line: number, text: string, suggestion?: string): void {
    this.add('error', { line, text, suggestion });
  }

  warn(line: number, text: string, suggestion?: string): void {
    this.add('warning', { line, text, suggestion });
  }

  notice(line: number, text: string, suggestion?: string): void {
    this.add('notice', { line, text, suggestion });
  }

  /** Says a thing once, at the first line it is true of, and counts how often it was meant. */
  warnOnce(key: string, line: number, message: { readonly text: string; readonly suggestion?: string }): void {
    const count = this.seen.get(key) ?? 0;
    this.seen.set(key, count + 1);
    if (count === 0) this.add('warning', { line, ...message });
  }

  add(severity: FileSeverity, message: Omit<FileMessage, 'severity'>): void {
    if (severity === 'error') this.errors += 1;
    if (this.kept.length >= this.most && severity === 'error') this.unlisted += 1;
    else if (this.kept.length < this.most) this.kept.push(dropUndefined({ severity, ...message }));
  }

  /** Messages by line; a last one counts the faults that are not listed. */
  messages(): FileMessage[] {
    const ordered = [...this.kept].sort((a, b) => a.line - b.line);
    if (this.unlisted > 0) ordered.push({ severity: 'error', line: 0, text: `${this.unlisted} further faults are not listed` });
    return ordered;
  }
}

function dropUndefined(message: FileMessage): FileMessage {
  const { severity, file, line, column, text, suggestion } = message;
  return {
    severity,
    ...(file === undefined ? {} : { file }),
    line,
    ...(column === undefined ? {} : { column }),
    text,
    ...(suggestion === undefined ? {} : { suggestion }),
  };
}

/** A piece of a file fit to be quoted in a message: short, and with control characters made visible. */
export function quoted(text: string): string {
  const LONGEST = 40;
  const short = text.length > LONGEST ? `${text.slice(0, LONGEST)}...` : text;
  return `"${short.replace(/[\u0000-\u001F\u007F-\u009F\uD800-\uDFFF]/g, (character) => `\\u${character.charCodeAt(0).toString(16).padStart(4, '0')}`)}"`;
}
