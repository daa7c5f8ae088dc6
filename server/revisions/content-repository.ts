import { managerOf, type Transaction } from '../database/transaction-runner';
import { Content } from './content-entity';
import { RevisionPart } from './revision-part-entity';

export interface StoredPart {
  readonly role: string;
  readonly hash: string;
  readonly body: Buffer;
}

export class ContentRepository {
  /** Stores each body once per team and points the revision at all of them. */
  async keep(transaction: Transaction, owner: { teamId: string; revisionId: string }, parts: readonly StoredPart[]): Promise<void> {
    const { teamId, revisionId } = owner;
    const manager = managerOf(transaction);
    const contents = parts.map(({ hash, body }) => ({ teamId, hash, body }));
    await manager.createQueryBuilder().insert().into(Content).values(contents).orIgnore().execute();
    await manager.getRepository(RevisionPart).insert(parts.map(({ role, hash }) => ({ revisionId, role, teamId, contentHash: hash })));
  }

  async ofRevision(transaction: Transaction, teamId: string, revisionId: string): Promise<StoredPart[]> {
    return managerOf(transaction)
      .createQueryBuilder()
      .select(['part.role AS "role"', 'content.hash AS "hash"', 'content.body AS "body"'])
      .from(RevisionPart, 'part')
      .innerJoin(Content, 'content', 'content.teamId = part.teamId AND content.hash = part.contentHash')
      .where('part.teamId = :teamId AND part.revisionId = :revisionId', { teamId, revisionId })
      .getRawMany<StoredPart>();
  }
}
