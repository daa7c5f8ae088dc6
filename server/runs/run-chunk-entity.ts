import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

export type ChunkState = 'waiting' | 'sent' | 'running' | 'done';

/** A piece of a run that is not over; gone once the run is. */
@Entity({ name: 'run_chunk' })
@Index('run_chunk_team', ['teamId', 'state'])
export class RunChunk {
  @PrimaryColumn('uuid', { name: 'run_id' })
  runId!: string;

  /** Its place in the plan. */
  @PrimaryColumn('integer')
  number!: number;

  @Column('uuid', { name: 'team_id' })
  teamId!: string;

  /** What to compute, in the words of the kind of run. */
  @Column('jsonb')
  chunk!: unknown;

  @Column('double precision')
  seconds!: number;

  @Column('text')
  state!: ChunkState;

  /** Counts who began it: only the last may write its part. */
  @Column('integer')
  attempt!: number;

  @Column('text', { nullable: true })
  worker!: string | null;

  /** Deflated JSON of what was computed. */
  @Column('bytea', { nullable: true })
  part!: Buffer | null;
}
