import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** The first answer to a request that may be sent again. */
@Entity({ name: 'replay' })
@Index('replay_age', ['createdAt'])
export class Replay {
  @PrimaryColumn('uuid', { name: 'person_id' })
  personId!: string;

  @PrimaryColumn('text')
  key!: string;

  @Column('text', { name: 'request_hash' })
  requestHash!: string;

  @Column('timestamptz', { name: 'created_at' })
  createdAt!: Date;

  /** Null while the first request runs. */
  @Column('jsonb', { nullable: true })
  answer!: object | null;
}
