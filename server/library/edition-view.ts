import type { EditionDetail, EditionHeader, FamilySummary } from '../../shared/contracts/library';
import type { StoredEdition, StoredFamily } from './stored-edition';

export type Names = ReadonlyMap<string, string>;

const named = (id: string, names: Names) => ({ id, name: names.get(id) ?? 'unknown' });

/** People an edition names. */
export const peopleOf = (edition: StoredEdition): string[] =>
  edition.publishedBy === null ? [edition.acceptedBy] : [edition.acceptedBy, edition.publishedBy];

export function editionHeaderOf(edition: StoredEdition, familyName: string, names: Names): EditionHeader {
  return {
    id: edition.id,
    familyId: edition.familyId,
    familyName,
    number: edition.number,
    state: edition.number === null ? 'accepted' : 'published',
    hash: edition.hash,
    cellCount: edition.cellCount,
    fileCount: edition.fileCount,
    fromGHz: edition.fromGHz,
    toGHz: edition.toGHz,
    thetasDeg: edition.thetasDeg,
    phisDeg: edition.phisDeg,
    verdict: edition.verdict,
    note: edition.publishNote ?? edition.note,
    acceptedBy: named(edition.acceptedBy, names),
    acceptedAt: edition.acceptedAt.toISOString(),
    publishedBy: edition.publishedBy === null ? null : named(edition.publishedBy, names),
    publishedAt: edition.publishedAt?.toISOString() ?? null,
  };
}

export function editionDetailOf(edition: StoredEdition, familyName: string, names: Names): EditionDetail {
  const { description, cells, quality, mapping, messages } = edition;
  return { ...editionHeaderOf(edition, familyName, names), description, cells, quality, mapping, messages };
}

/** Published editions newest first, then what is only accepted. */
export function inReadingOrder<Stored extends StoredEdition>(editions: readonly Stored[]): Stored[] {
  return [...editions].sort((a, b) => (b.number ?? 0) - (a.number ?? 0) || b.acceptedAt.getTime() - a.acceptedAt.getTime());
}

export function familySummaryOf(family: StoredFamily, editions: readonly StoredEdition[], more: { names: Names; useCount: number }): FamilySummary {
  const ordered = inReadingOrder(editions);
  const newest = ordered[0];
  if (newest === undefined) throw new Error(`the family ${family.id} has no edition`);
  const { kind, operation, periodXMm, periodYMm, designFrequencyGHz, provenance } = newest.description;
  return {
    id: family.id,
    name: family.name,
    kind,
    operation,
    periodXMm,
    periodYMm,
    designFrequencyGHz,
    provenance,
    editions: ordered.map((edition) => editionHeaderOf(edition, family.name, more.names)),
    useCount: more.useCount,
  };
}
