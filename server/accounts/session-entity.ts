import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** One signed-in browser. It ends when idle, at its absolute end, or when revoked; the row stays until swept. */
@Entity({ name: 'session' })
@Index('session_person', ['personId'])
export class Session {
  @PrimaryColumn('uuid')
  id!: string;

  @Column('uuid', { name: 'person_id' })
  personId!: string;

  /** The team the person has chosen to work in. */
  @Column('uuid', { name: 'team_id' })
  teamId!: string;

  @Column('timestamptz', { name: 'created_at' })
  createdAt!: Date;

  @Column('timestamptz', { name: 'last_used_at' })
  lastUsedAt!: Date;

  /** Absolute end, whatever the use. */
  @Column('timestamptz', { name: 'ends_at' })
  endsAt!: Date;

  @Column('timestamptz', { name: 'revoked_at', nullable: true })
  revokedAt!: Date | null;

  @Column('text')
  address!: string;

  /** User-Agent as sent, cut to 200 characters. */
  @Column('text')
  browser!: string;
}
