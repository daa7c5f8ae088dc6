import type { CellEdition } from '../../shared/model/cell-family';

/** An edition with the hash that names its content. */
export type SourcedEdition = CellEdition & { readonly hash: string };

/** Where predictions get published editions from. */
export interface EditionSource {
  /** @throws NotFound when the team has no published edition of this id */
  editionForEngine(teamId: string, editionId: string): Promise<SourcedEdition>;
}
