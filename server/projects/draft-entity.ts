import { Column, Entity, Index, PrimaryColumn } from 'typeorm';
import type { DesignDocument } from '../../shared/model/design-document';

/** What a panel is at the moment: the one thing that changes. */
@Entity({ name: 'draft' })
@Index('draft_edition', ['teamId', 'editionId'])
export class Draft {
  /** Id of the panel. */
  @PrimaryColumn('uuid', { name: 'panel_id' })
  id!: string;

  @Column('uuid', { name: 'team_id' })
  teamId!: string;

  /** Counts changes of the design and of the panel's name; the entity tag is made of it. */
  @Column('integer')
  version!: number;

  @Column('jsonb')
  design!: DesignDocument;

  /** The hash that a revision of this design would have. */
  @Column('text')
  hash!: string;

  /** Edition that the cells come from, if any. */
  @Column('uuid', { name: 'edition_id', nullable: true })
  editionId!: string | null;

  @Column('timestamptz', { name: 'changed_at' })
  changedAt!: Date;

  @Column('uuid', { name: 'changed_by' })
  changedBy!: string;
}
