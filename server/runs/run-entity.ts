import { Column, Entity, Index, PrimaryColumn } from 'typeorm';
import type { RunKind, RunParameters, RunState } from '../../shared/contracts/runs';
import type { DesignDocument } from '../../shared/model/design-document';

/** A computation longer than a request: what is asked of which design, and how far it has come. */
@Entity({ name: 'run' })
@Index('run_team_panel', ['teamId', 'panelId', 'createdAt'])
@Index('run_waiting', ['state', 'teamId'])
@Index('run_active_key', ['teamId', 'resultKey', 'engineVersion', 'revisionId'], { unique: true, where: `"state" IN ('queued', 'running')` })
export class Run {
  @PrimaryColumn('uuid')
  id!: string;

  @Column('uuid', { name: 'team_id' })
  teamId!: string;

  @Column('uuid', { name: 'panel_id' })
  panelId!: string;

  /** As it was called when the run was started. */
  @Column('text', { name: 'panel_name' })
  panelName!: string;

  @Column('text')
  kind!: RunKind;

  @Column('jsonb')
  parameters!: RunParameters<RunKind>;

  /** What is computed: a draft may change meanwhile. */
  @Column('jsonb')
  design!: DesignDocument;

  @Column('uuid', { name: 'edition_id', nullable: true })
  editionId!: string | null;

  /** Hash of design and edition, as a revision of them has it. */
  @Column('text', { name: 'content_hash' })
  contentHash!: string;

  /** Hash of content and parameters: with kind and engine version it names the result. */
  @Column('text', { name: 'result_key' })
  resultKey!: string;

  @Column('text', { name: 'engine_version' })
  engineVersion!: string;

  /** Either the version of the draft, or the revision. */
  @Column('integer', { name: 'draft_version', nullable: true })
  draftVersion!: number | null;

  @Column('uuid', { name: 'revision_id', nullable: true })
  revisionId!: string | null;

  @Column('integer', { name: 'revision_number', nullable: true })
  revisionNumber!: number | null;

  @Column('text')
  state!: RunState;

  @Column('timestamptz', { name: 'created_at' })
  createdAt!: Date;

  @Column('uuid', { name: 'created_by' })
  createdBy!: string;

  @Column('text', { name: 'created_by_name' })
  createdByName!: string;

  @Column('timestamptz', { name: 'started_at', nullable: true })
  startedAt!: Date | null;

  @Column('timestamptz', { name: 'finished_at', nullable: true })
  finishedAt!: Date | null;

  @Column('integer', { name: 'chunk_count' })
  chunkCount!: number;

  @Column('integer', { name: 'done_count' })
  doneCount!: number;

  /** Estimates on one core, of all chunks and of those that are done. */
  @Column('double precision', { name: 'planned_seconds' })
  plannedSeconds!: number;

  @Column('double precision', { name: 'done_seconds' })
  doneSeconds!: number;

  @Column('integer', { name: 'restart_count' })
  restartCount!: number;

  /** The result was there before the run. */
  @Column('boolean')
  reused!: boolean;

  @Column('text', { name: 'failure_message', nullable: true })
  failureMessage!: string | null;

  @Column('uuid', { name: 'failure_id', nullable: true })
  failureId!: string | null;
}
