import { Column, Entity, Index, PrimaryColumn, Unique } from 'typeorm';
import type { Role } from '../../shared/contracts/common';

@Entity({ name: 'invitation' })
@Unique('invitation_hash', ['hash'])
@Index('invitation_team', ['teamId'])
export class Invitation {
  @PrimaryColumn('uuid')
  id!: string;

  @Column('uuid', { name: 'team_id' })
  teamId!: string;

  @Column('text')
  email!: string;

  @Column('text', { array: true })
  roles!: Role[];

  /** SHA-256 of the token in the letter. */
  @Column('text')
  hash!: string;

  /** Null for the first administrator of a team, whom nobody in it could invite. */
  @Column('uuid', { name: 'invited_by', nullable: true })
  invitedBy!: string | null;

  @Column('timestamptz', { name: 'created_at' })
  createdAt!: Date;

  @Column('timestamptz', { name: 'expires_at' })
  expiresAt!: Date;

  @Column('timestamptz', { name: 'accepted_at', nullable: true })
  acceptedAt!: Date | null;
}
