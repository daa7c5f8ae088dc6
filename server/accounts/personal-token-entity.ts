import { Column, Entity, Index, PrimaryColumn, Unique } from 'typeorm';
import type { Scope } from '../../shared/contracts/common';

/** A key for scripts: works for one person in one team, narrowed to scopes, until it expires. */
@Entity({ name: 'personal_token' })
@Unique('personal_token_hash', ['hash'])
@Index('personal_token_person', ['personId'])
export class PersonalToken {
  @PrimaryColumn('uuid')
  id!: string;

  @Column('uuid', { name: 'person_id' })
  personId!: string;

  @Column('uuid', { name: 'team_id' })
  teamId!: string;

  @Column('text')
  name!: string;

  @Column('text', { array: true })
  scopes!: Scope[];

  /** SHA-256 of the secret, which is shown once and never kept. */
  @Column('text')
  hash!: string;

  @Column('timestamptz', { name: 'created_at' })
  createdAt!: Date;

  @Column('timestamptz', { name: 'expires_at' })
  expiresAt!: Date;

  @Column('timestamptz', { name: 'last_used_at', nullable: true })
  lastUsedAt!: Date | null;
}
