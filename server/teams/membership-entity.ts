import { Column, Entity, Index, PrimaryColumn } from 'typeorm';
import type { Role } from '../../shared/contracts/common';

/** A person in a team. Being disabled is said here, so that one team cannot shut a person out of another. */
@Entity({ name: 'membership' })
@Index('membership_person', ['id'])
export class Membership {
  @PrimaryColumn('uuid', { name: 'team_id' })
  teamId!: string;

  /** The person: within a team, a member is known by it. */
  @PrimaryColumn('uuid', { name: 'person_id' })
  id!: string;

  @Column('text', { array: true })
  roles!: Role[];

  @Column('timestamptz', { name: 'joined_at' })
  joinedAt!: Date;

  @Column('timestamptz', { name: 'disabled_at', nullable: true })
  disabledAt!: Date | null;

  @Column('timestamptz', { name: 'last_seen_at', nullable: true })
  lastSeenAt!: Date | null;
}
