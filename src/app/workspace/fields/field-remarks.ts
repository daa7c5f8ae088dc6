import type { Problem } from '../../../../shared/contracts/common';
import type { Warning } from '../../../../shared/model/figures';
import type { DraftFault } from '../save-progress';

export interface FieldRemark {
  readonly weight: 'fault' | 'serious' | 'warn' | 'note';
  readonly text: string;
}

export interface RemarkSources {
  readonly warnings: readonly Warning[];
  readonly failure: Problem | null;
  readonly faults: readonly DraftFault[];
}

/** A pointer into the design, whatever the sender wrote in front of it. */
export function designPointer(pointer: string): string {
  return pointer.replace(/^#/, '').replace(/^\/design(?=\/|$)/, '');
}

/** What is to be said about one field or group, faults first, nothing twice. */
export function remarksAt(pointers: readonly string[], { warnings, failure, faults }: RemarkSources): readonly FieldRemark[] {
  const here = (pointer: string): boolean => pointers.includes(designPointer(pointer));
  const remarks: FieldRemark[] = [
    ...[...(failure?.errors ?? []), ...faults].filter(({ pointer }) => here(pointer)).map(({ detail }): FieldRemark => ({ weight: 'fault', text: detail })),
    ...warnings.filter(({ pointer }) => here(pointer)).map(({ severity, message }): FieldRemark => ({ weight: severity, text: message })),
  ];
  return remarks.filter((remark, place) => remarks.findIndex(({ text }) => text === remark.text) === place);
}
