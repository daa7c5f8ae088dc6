import { Column, Entity, Index, PrimaryColumn, Unique } from 'typeorm';

/** A frozen state of a panel. Never changed: names stand as they were when it was frozen. */
@Entity({ name: 'revision' })
@Unique('revision_number', ['panelId', 'number'])
@Index('revision_team', ['teamId', 'panelId'])
@Index('revision_edition', ['teamId', 'editionId'])
export class Revision {
  @PrimaryColumn('uuid')
  id!: string;

  @Column('uuid', { name: 'team_id' })
  teamId!: string;

  @Column('uuid', { name: 'panel_id' })
  panelId!: string;

  /** 1, 2, 3 ... within the panel, without gaps. */
  @Column('integer')
  number!: number;

  /** SHA-256 over the canonical JSON of the whole content. */
  @Column('text')
  hash!: string;

  @Column('uuid', { name: 'parent_id', nullable: true })
  parentId!: string | null;

  @Column('integer', { name: 'parent_number', nullable: true })
  parentNumber!: number | null;

  @Column('integer', { name: 'restored_from_number', nullable: true })
  restoredFromNumber!: number | null;

  @Column('uuid', { name: 'edition_id', nullable: true })
  editionId!: string | null;

  @Column('text', { name: 'panel_name' })
  panelName!: string;

  @Column('text', { name: 'project_name' })
  projectName!: string;

  @Column('uuid', { name: 'author_id' })
  authorId!: string;

  @Column('text', { name: 'author_name' })
  authorName!: string;

  @Column('text')
  message!: string;

  @Column('timestamptz', { name: 'created_at' })
  createdAt!: Date;
}
