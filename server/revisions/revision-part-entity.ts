import { Column, Entity, PrimaryColumn } from 'typeorm';

/** Which content plays a role in a revision. An unchanged part points at the content it had before. */
@Entity({ name: 'revision_part' })
export class RevisionPart {
  @PrimaryColumn('uuid', { name: 'revision_id' })
  revisionId!: string;

  /** `design` or `edition`. */
  @PrimaryColumn('text')
  role!: string;

  @Column('uuid', { name: 'team_id' })
  teamId!: string;

  @Column('text', { name: 'content_hash' })
  contentHash!: string;
}
