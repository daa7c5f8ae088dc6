import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** Something computed from content that never changes: disposable, and the same whenever it is computed again. */
@Entity({ name: 'result' })
@Index('result_age', ['createdAt'])
export class Result {
  @PrimaryColumn('uuid', { name: 'team_id' })
  teamId!: string;

  /** Hash of what it was computed from. */
  @PrimaryColumn('text', { name: 'content_hash' })
  contentHash!: string;

  /** What was computed: `figures`. */
  @PrimaryColumn('text')
  kind!: string;

  @PrimaryColumn('text', { name: 'engine_version' })
  engineVersion!: string;

  @Column('jsonb')
  body!: object;

  @Column('timestamptz', { name: 'created_at' })
  createdAt!: Date;
}
