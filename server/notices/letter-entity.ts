import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** A letter waiting in the outbox, written in the transaction of its cause. */
@Entity({ name: 'letter' })
@Index('letter_due', ['nextAttemptAt'], { where: 'sent_at IS NULL' })
export class OutboxLetter {
  @PrimaryColumn('uuid')
  id!: string;

  @Column('text')
  recipient!: string;

  @Column('text')
  subject!: string;

  /** Text, sealed because it may hold a single-use link; empty once sent. */
  @Column('bytea', { name: 'sealed_text' })
  sealedText!: Buffer;

  @Column('timestamptz', { name: 'created_at' })
  createdAt!: Date;

  @Column('integer')
  attempts!: number;

  /** Null when sent or given up. */
  @Column('timestamptz', { name: 'next_attempt_at', nullable: true })
  nextAttemptAt!: Date | null;

  @Column('timestamptz', { name: 'sent_at', nullable: true })
  sentAt!: Date | null;

  @Column('text', { name: 'last_error', nullable: true })
  lastError!: string | null;
}
