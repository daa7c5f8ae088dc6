import { ChangeDetectionStrategy, Component, computed, input, output, signal } from '@angular/core';
import type { FileMessage, ImportMapping, Inspection } from '../../../shared/contracts/library';
import { CheckField } from '../ui/check-field';
import { StateMark } from '../ui/state-mark';
import type { MarkState } from '../ui/state-mark';

const MARKS: Readonly<Record<FileMessage['severity'], MarkState>> = { error: 'falls-short', warning: 'stale', notice: 'meets' };
const AT_FIRST = 30;

/** What every file holds and what is wrong with it, with the decisions a person can take: leave out, take as a second measurement, keep what is complete, name the option line. */
@Component({
  selector: 'slant-file-findings',
  imports: [CheckField, StateMark],
  templateUrl: './file-findings.html',
  styleUrl: './quality-list.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class FileFindings {
  readonly inspection = input.required<Inspection>();
  readonly mapping = input.required<ImportMapping>();
  readonly changed = output<ImportMapping>();
  protected readonly limit = signal(AT_FIRST);
  protected readonly onlyTold = signal(true);
  protected readonly told = computed(() => this.inspection().files.filter((file) => file.messages.length > 0 || file.status !== 'read'));
  protected readonly rows = computed(() => (this.onlyTold() ? this.told() : this.inspection().files));
  protected readonly shown = computed(() => this.rows().slice(0, this.limit()));
  protected readonly mark = (severity: FileMessage['severity']): MarkState => MARKS[severity];

  protected place(message: FileMessage): string {
    if (message.line === 0) return '';
    return message.column === undefined ? `line ${message.line}: ` : `line ${message.line}, column ${message.column}: `;
  }

  protected isIgnored(name: string): boolean {
    return this.mapping().ignoredFiles?.includes(name) ?? false;
  }

  protected setIgnored(name: string, ignored: boolean): void {
    const others = (this.mapping().ignoredFiles ?? []).filter((file) => file !== name);
    this.changed.emit({ ...this.mapping(), ignoredFiles: ignored ? [...others, name] : others });
  }

  protected isRepeat(name: string): boolean {
    return this.mapping().repeatFiles?.includes(name) ?? false;
  }

  protected setRepeat(name: string, repeats: boolean): void {
    const others = (this.mapping().repeatFiles ?? []).filter((file) => file !== name);
    this.changed.emit({ ...this.mapping(), repeatFiles: repeats ? [...others, name] : others });
  }

  protected keepRecords(file: string, records: number): void {
    const others = (this.mapping().keepFirstRecords ?? []).filter((entry) => entry.file !== file);
    this.changed.emit({ ...this.mapping(), keepFirstRecords: [...others, { file, records }] });
  }

  protected useOptionLine(file: string, optionLine: string): void {
    const others = (this.mapping().optionLines ?? []).filter((entry) => entry.file !== file);
    this.changed.emit({ ...this.mapping(), optionLines: [...others, { file, optionLine }] });
  }

  protected showMore(): void {
    this.limit.update((limit) => limit + 200);
  }
}
