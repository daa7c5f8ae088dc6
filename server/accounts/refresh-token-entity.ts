import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** One link of a session's chain of refresh tokens. A second use of the same link ends the session. */
@Entity({ name: 'refresh_token' })
@Index('refresh_token_session', ['sessionId'])
export class RefreshToken {
  /** SHA-256 of the token. */
  @PrimaryColumn('text')
  hash!: string;

  @Column('uuid', { name: 'session_id' })
  sessionId!: string;

  @Column('timestamptz', { name: 'created_at' })
  createdAt!: Date;

  @Column('timestamptz', { name: 'used_at', nullable: true })
  usedAt!: Date | null;
}
