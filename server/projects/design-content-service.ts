import { createHash } from 'node:crypto';
import { canonicalJson } from '../../shared/model/canonical-json';
import type { DesignDocument } from '../../shared/model/design-document';
import { InvalidInput } from '../http/problems';

/** Names and hashes of a team's editions; unknown ones are absent. */
export interface EditionNames {
  editionNames(teamId: string, ids: readonly string[]): Promise<ReadonlyMap<string, { familyName: string; number: number | null; hash: string }>>;
}

/** What a design says of its edition, so that its hash covers the cells too. */
export interface EditionReference {
  readonly id: string;
  readonly familyName: string;
  readonly number: number;
  readonly hash: string;
}

export interface ContentPart {
  readonly role: 'design' | 'edition';
  /** Canonical JSON. */
  readonly body: Buffer;
  readonly hash: string;
}

/** Everything that a revision freezes. */
export interface DesignContent {
  readonly design: DesignDocument;
  readonly edition: EditionReference | null;
  readonly parts: readonly ContentPart[];
  /** SHA-256 over the canonical JSON of `{ design, edition }`. */
  readonly hash: string;
}

const sha256 = (bytes: Buffer): string => createHash('sha256').update(bytes).digest('hex');

/** Canonical JSON as bytes, and its SHA-256. */
export function hashedJson(value: unknown): { body: Buffer; hash: string } {
  const body = Buffer.from(canonicalJson(value), 'utf8');
  return { body, hash: sha256(body) };
}

export function contentFrom(design: DesignDocument, edition: EditionReference | null): DesignContent {
  const parts: ContentPart[] = [{ role: 'design', ...hashedJson(design) }];
  if (edition !== null) parts.push({ role: 'edition', ...hashedJson(edition) });
  return { design, edition, parts, hash: hashedJson({ design, edition }).hash };
}

/** Makes hashes: the server alone does, so that nobody can claim one. */
export class DesignContentService {
  constructor(private readonly editions: EditionNames) {}

  /**
   * @param at pointer of the design in the request
   * @throws InvalidInput when the design names an edition that the team has not published
   */
  async contentOf(teamId: string, design: DesignDocument, at = '#/design'): Promise<DesignContent> {
    return contentFrom(design, await this.editionOf(teamId, design, at));
  }

  private async editionOf(teamId: string, { cells }: DesignDocument, at: string): Promise<EditionReference | null> {
    if (cells.kind !== 'edition') return null;
    const named = (await this.editions.editionNames(teamId, [cells.editionId])).get(cells.editionId);
    if (named === undefined || named.number === null) {
      throw new InvalidInput([{ pointer: `${at}/cells/editionId`, detail: 'there is no such published edition' }]);
    }
    return { id: cells.editionId, familyName: named.familyName, number: named.number, hash: named.hash };
  }
}
