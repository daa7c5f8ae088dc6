import { Column, Entity, PrimaryColumn } from 'typeorm';

/** One change. Rows of a team form a chain: each hash covers the row and the hash before it. */
@Entity({ name: 'audit_row' })
export class AuditRow {
  @PrimaryColumn('uuid', { name: 'team_id' })
  teamId!: string;

  /** 1, 2, 3 ... within the team, without gaps. */
  @PrimaryColumn('integer')
  sequence!: number;

  @Column('timestamptz')
  at!: Date;

  /** Null when the system acted, as at the first start. */
  @Column('uuid', { name: 'person_id', nullable: true })
  personId!: string | null;

  /** Dotted verb: `member.changed`, `revision.created`. */
  @Column('text')
  action!: string;

  /** What it happened to: `person:<id>`, `revision:<id>`. */
  @Column('text')
  object!: string;

  @Column('jsonb')
  detail!: Record<string, unknown>;

  @Column('text', { name: 'previous_hash' })
  previousHash!: string;

  @Column('text')
  hash!: string;
}
