import type { EditionDetail, EditionUse, FamilyDetail, FamilySummary, KeptFile } from '../../shared/contracts/library';
import type { CellEdition } from '../../shared/model/cell-family';
import type { Ground } from '../database/ground';
import type { Transaction } from '../database/transaction-runner';
import { NotFound } from '../http/problems';
import type { CellFamily } from './cell-family-entity';
import { CellFamilyRepository } from './cell-family-repository';
import type { Edition } from './edition-entity';
import { EditionRepository } from './edition-repository';
import { editionDetailOf, familySummaryOf, inReadingOrder, peopleOf, type Names } from './edition-view';
import { KeptFileRepository } from './kept-file-repository';
import { readResponseBlock } from './response-block';

/** Names for people, and where editions are used: other features know. */
export interface LibraryNeighbours {
  readonly namesOfPeople: (transaction: Transaction, ids: readonly string[]) => Promise<Names>;
  readonly usesOfEdition: (teamId: string, editionId: string) => Promise<EditionUse[]>;
  readonly countUses: (teamId: string) => Promise<ReadonlyMap<string, number>>;
}

export interface FamilyFilter {
  readonly text?: string;
  readonly frequencyGHz?: number;
  readonly periodMm?: number;
  readonly thetaDeg?: number;
}

/** Reads the library. Changes go through ImportService and PublicationService. */
export class LibraryService {
  private readonly families = new CellFamilyRepository();
  private readonly editions = new EditionRepository();
  private readonly files = new KeptFileRepository();

  constructor(
    private readonly ground: Pick<Ground, 'transactions'>,
    private readonly neighbours: LibraryNeighbours,
  ) {}

  async list(teamId: string, filter: FamilyFilter): Promise<FamilySummary[]> {
    const uses = await this.neighbours.countUses(teamId);
    return this.ground.transactions.read(async (transaction) => {
      const families = await this.families.list(transaction, teamId, filter.text);
      const editions = await this.editions.ofTeamAll(transaction, teamId);
      const names = await this.neighbours.namesOfPeople(transaction, [...new Set(editions.flatMap(peopleOf))]);
      return families.flatMap((family) => {
        const own = editions.filter((edition) => edition.familyId === family.id);
        if (!own.some((edition) => fits(edition, filter))) return [];
        return [familySummaryOf(family, own, { names, useCount: sumOfUses(own, uses) })];
      });
    });
  }

  async family(teamId: string, familyId: string): Promise<FamilyDetail> {
    const uses = await this.neighbours.countUses(teamId);
    return this.ground.transactions.read(async (transaction) => {
      const family = await this.families.require(transaction, teamId, familyId);
      const editions = inReadingOrder(await this.editions.ofFamily(transaction, teamId, familyId));
      const newest = editions[0];
      if (newest === undefined) throw new NotFound('family');
      const names = await this.neighbours.namesOfPeople(transaction, [...new Set(editions.flatMap(peopleOf))]);
      const summary = familySummaryOf(family, editions, { names, useCount: sumOfUses(editions, uses) });
      return { ...summary, description: newest.description };
    });
  }

  async edition(teamId: string, editionId: string): Promise<EditionDetail> {
    return this.ground.transactions.read(async (transaction) => {
      const edition = await this.editions.require(transaction, teamId, editionId);
      return this.detail(transaction, teamId, edition);
    });
  }

  /** For other parts of the feature, inside their transaction. */
  async detail(transaction: Transaction, teamId: string, edition: Edition): Promise<EditionDetail> {
    const family = await this.families.require(transaction, teamId, edition.familyId);
    const names = await this.neighbours.namesOfPeople(transaction, peopleOf(edition));
    return editionDetailOf(edition, family.name, names);
  }

  /** The stored responses as they travel. */
  async responseBlock(teamId: string, editionId: string): Promise<Buffer> {
    const block = await this.ground.transactions.read((transaction) => this.editions.responses(transaction, teamId, editionId));
    if (block === null) throw new NotFound('edition');
    return block;
  }

  /** What the engine needs of a published edition. @throws NotFound */
  async editionForEngine(teamId: string, editionId: string): Promise<CellEdition & { hash: string }> {
    return this.ground.transactions.read(async (transaction) => {
      const edition = await this.editions.require(transaction, teamId, editionId);
      const block = await this.editions.responses(transaction, teamId, editionId);
      if (block === null || edition.number === null) throw new NotFound('edition');
      return { description: edition.description, cells: edition.cells, responses: readResponseBlock(block), hash: edition.hash };
    });
  }

  /** The newest published edition of a family by its name, for demo data and the like; null when there is none. */
  async newestEdition(teamId: string, familyName: string): Promise<{ id: string; number: number } | null> {
    return this.ground.transactions.read(async (transaction) => {
      const family: CellFamily | null = await this.families.byName(transaction, teamId, familyName);
      if (family === null) return null;
      const [newest] = inReadingOrder(await this.editions.ofFamily(transaction, teamId, family.id));
      return newest === undefined || newest.number === null ? null : { id: newest.id, number: newest.number };
    });
  }

  /** Name and number of editions, for lists elsewhere. Unknown ones and other teams' are absent. */
  async editionNames(teamId: string, ids: readonly string[]): Promise<ReadonlyMap<string, { familyName: string; number: number | null; hash: string }>> {
    return this.ground.transactions.read(async (transaction) => {
      const found = new Map<string, { familyName: string; number: number | null; hash: string }>();
      for (const id of new Set(ids)) {
        const edition = await this.editions.find(transaction, teamId, id);
        if (edition === null) continue;
        const family = await this.families.require(transaction, teamId, edition.familyId);
        found.set(id, { familyName: family.name, number: edition.number, hash: edition.hash });
      }
      return found;
    });
  }

  async uses(teamId: string, editionId: string): Promise<EditionUse[]> {
    await this.ground.transactions.read((transaction) => this.editions.require(transaction, teamId, editionId));
    return this.neighbours.usesOfEdition(teamId, editionId);
  }

  async fileList(teamId: string, editionId: string, page: { after?: string; limit: number }): Promise<{ items: KeptFile[]; next: string | null }> {
    return this.ground.transactions.read(async (transaction) => {
      await this.editions.require(transaction, teamId, editionId);
      const rows = await this.files.list(transaction, { teamId, editionId }, { after: page.after ?? '', limit: page.limit + 1 });
      const shown = rows.slice(0, page.limit);
      return {
        items: shown.map(({ name, bytes, sha256 }) => ({ name, bytes, sha256 })),
        next: rows.length > page.limit ? (shown.at(-1)?.name ?? null) : null,
      };
    });
  }

  async file(teamId: string, sha256: string): Promise<{ name: string; body: Buffer }> {
    const file = await this.ground.transactions.read((transaction) => this.files.read(transaction, teamId, sha256));
    if (file === null) throw new NotFound('file');
    return file;
  }
}

function fits(edition: Edition, filter: FamilyFilter): boolean {
  const { frequencyGHz, periodMm, thetaDeg } = filter;
  const { periodXMm, periodYMm } = edition.description;
  if (frequencyGHz !== undefined && (frequencyGHz < edition.fromGHz || frequencyGHz > edition.toGHz)) return false;
  if (periodMm !== undefined && Math.abs(periodXMm - periodMm) > 1e-6 && Math.abs(periodYMm - periodMm) > 1e-6) return false;
  return thetaDeg === undefined || thetaDeg <= Math.max(...edition.thetasDeg);
}

const sumOfUses = (editions: readonly Edition[], uses: ReadonlyMap<string, number>): number =>
  editions.reduce((sum, edition) => sum + (uses.get(edition.id) ?? 0), 0);
