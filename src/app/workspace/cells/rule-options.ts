import type { Cells } from '../../../../shared/model/design-document';

type Rule = Extract<Cells, { kind: 'edition' }>['rule'];

/** The rules of assignment as the sheets name them. */
export const RULE_OPTIONS: readonly { readonly value: Rule; readonly label: string }[] = [
  { value: 'nearest-phase', label: 'Nearest phase' },
  { value: 'least-error', label: 'Least complex error' },
  { value: 'band-fit', label: 'Band fit' },
];

/** The same within a sentence. */
export function ruleText(rule: Rule): string {
  return (RULE_OPTIONS.find(({ value }) => value === rule)?.label ?? rule).toLowerCase();
}
