import type { EngineEdition } from '../engine/prediction-task';
import { RecentMap } from '../engine/recent-map';
import { editionBytes, shareEdition } from '../engine/share-edition';
import type { EditionSource } from './edition-source';

const SHELF_BYTES = 256 * 1024 * 1024;

/** Editions in use, read once and kept in memory that the threads share. A published edition never changes, so none goes stale. */
export class EditionShelf {
  private readonly shelf = new RecentMap<EngineEdition>(SHELF_BYTES);

  constructor(private readonly source: EditionSource) {}

  /** @throws NotFound */
  async take(teamId: string, editionId: string): Promise<EngineEdition> {
    const key = `${teamId} ${editionId}`;
    const known = this.shelf.get(key);
    if (known !== undefined) return known;
    const edition = await this.source.editionForEngine(teamId, editionId);
    const shared = { key: `${editionId} ${edition.hash}`, edition: shareEdition(edition) };
    this.shelf.set(key, shared, editionBytes(edition));
    return shared;
  }
}
