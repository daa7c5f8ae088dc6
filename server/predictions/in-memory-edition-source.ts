import type { CellEdition } from '../../shared/model/cell-family';
import { NotFound } from '../http/problems';
import type { EditionSource, SourcedEdition } from './edition-source';

/** Editions without a database, for tests. */
export class InMemoryEditionSource implements EditionSource {
  private readonly editions = new Map<string, SourcedEdition>();

  add(teamId: string, editionId: string, edition: CellEdition, hash: string): void {
    this.editions.set(`${teamId} ${editionId}`, { ...edition, hash });
  }

  async editionForEngine(teamId: string, editionId: string): Promise<SourcedEdition> {
    const edition = this.editions.get(`${teamId} ${editionId}`);
    if (edition === undefined) throw new NotFound('edition');
    return edition;
  }
}
