import { Column, Entity, PrimaryColumn } from 'typeorm';

/** A worker process that takes chunks, as long as it says so every few seconds. */
@Entity({ name: 'run_worker' })
export class RunWorkerRow {
  @PrimaryColumn('uuid')
  id!: string;

  /** Host and process, for the log. */
  @Column('text')
  name!: string;

  @Column('integer')
  threads!: number;

  @Column('timestamptz', { name: 'seen_at' })
  seenAt!: Date;
}
