import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

@Entity({ name: 'password_reset' })
@Index('password_reset_person', ['personId'])
export class PasswordReset {
  /** SHA-256 of the token in the letter. */
  @PrimaryColumn('text')
  hash!: string;

  @Column('uuid', { name: 'person_id' })
  personId!: string;

  @Column('timestamptz', { name: 'created_at' })
  createdAt!: Date;

  @Column('timestamptz', { name: 'expires_at' })
  expiresAt!: Date;

  @Column('timestamptz', { name: 'used_at', nullable: true })
  usedAt!: Date | null;
}
