import { managerOf, type Transaction } from '../database/transaction-runner';
import { EditionFile } from './edition-file-entity';
import { KeptFile } from './kept-file-entity';

export interface NewFile {
  readonly name: string;
  readonly sha256: string;
  readonly body: Buffer;
}

/** Rows per statement: large enough for speed, small enough for the parameter limit of PostgreSQL (65535). */
const ROWS_PER_INSERT = 500;

export class KeptFileRepository {
  /** Keeps the bytes, each content once, and names them for the edition. */
  async keep(transaction: Transaction, owner: { teamId: string; editionId: string }, files: readonly NewFile[]): Promise<void> {
    const { teamId, editionId } = owner;
    const byHash = new Map(files.map((file) => [file.sha256, file]));
    const contents = [...byHash.values()].map(({ sha256, body }) => ({ teamId, sha256, body }));
    const names = files.map(({ name, sha256, body }) => ({ editionId, name, teamId, sha256, bytes: body.length }));
    for (let i = 0; i < contents.length; i += ROWS_PER_INSERT) {
      await managerOf(transaction).createQueryBuilder().insert().into(KeptFile).values(contents.slice(i, i + ROWS_PER_INSERT)).orIgnore().execute();
    }
    for (let i = 0; i < names.length; i += ROWS_PER_INSERT) {
      await managerOf(transaction).getRepository(EditionFile).insert(names.slice(i, i + ROWS_PER_INSERT));
    }
  }

  /** Names after `after` in alphabetical order, at most `limit` of them. */
  async list(transaction: Transaction, of: { teamId: string; editionId: string }, page: { after: string; limit: number }): Promise<EditionFile[]> {
    return managerOf(transaction)
      .getRepository(EditionFile)
      .createQueryBuilder('file')
      .where('file.teamId = :teamId AND file.editionId = :editionId AND file.name > :after', { ...of, after: page.after })
      .orderBy('file.name')
      .limit(page.limit)
      .getMany();
  }

  /** The bytes under a hash, with one of the names they came with. */
  async read(transaction: Transaction, teamId: string, sha256: string): Promise<{ name: string; body: Buffer } | null> {
    const manager = managerOf(transaction);
    const kept = await manager.getRepository(KeptFile).findOneBy({ teamId, sha256 });
    if (kept === null) return null;
    const named = await manager.getRepository(EditionFile).findOne({ where: { teamId, sha256 }, order: { name: 'ASC' } });
    return { name: named?.name ?? `${sha256}.bin`, body: kept.body };
  }
}
