/** How much a message about a file weighs: an `error` refuses the file, a `warning` asks for a look, a `notice` tells a fact. */
export type FileSeverity = 'error' | 'warning' | 'notice';

/** One statement about an imported file, ready to be shown beside the line it speaks of. */
export interface FileMessage {
  readonly severity: FileSeverity;
  /** Name of the file, where several are read together. */
  readonly file?: string;
  /** Line of the file from 1; 0 when the message is about the file as a whole. */
  readonly line: number;
  /** Column from 1, when one place on the line is meant. */
  readonly column?: number;
  /** What was found, with the offending text or number. */
  readonly text: string;
  /** What to do about it. */
  readonly suggestion?: string;
}
