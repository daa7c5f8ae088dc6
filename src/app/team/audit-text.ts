const HASH = /^[0-9a-f]{64}$/;
const UUID = /[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}/g;

/** "panel 42ae568d" from "panel:42ae568d-9fdb-...": enough to tell objects apart on one page. */
export function objectText(object: string): string {
  return object.replace(UUID, (id) => id.slice(0, 8)).replace(':', ' ');
}

/** The detail of a row as words: "email range@...; roles range". Hashes and ids are cut to what tells them apart. */
export function detailText(detail: Readonly<Record<string, unknown>>): string {
  return Object.entries(detail)
    .map(([name, value]) => `${spelt(name)} ${valueText(value)}`)
    .join('; ');
}

/** "endOtherSessions" reads as "end other sessions". */
const spelt = (name: string): string => name.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);

function valueText(value: unknown): string {
  if (value === null || value === '') return 'none';
  if (typeof value === 'string') return HASH.test(value) ? value.slice(0, 12) : value.replace(UUID, (id) => id.slice(0, 8)).replace(/\.$/, '');
  if (Array.isArray(value)) return value.length === 0 ? 'none' : value.map(valueText).join(' + ');
  if (typeof value === 'object') return `(${detailText(value as Readonly<Record<string, unknown>>)})`;
  return String(value);
}
