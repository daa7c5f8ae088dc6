import { Column, Entity, PrimaryColumn } from 'typeorm';

/** A body by its hash, once per team, never changed. */
@Entity({ name: 'content' })
export class Content {
  @PrimaryColumn('uuid', { name: 'team_id' })
  teamId!: string;

  /** SHA-256 of the body; the database checks it. */
  @PrimaryColumn('text')
  hash!: string;

  /** Canonical JSON. */
  @Column('bytea')
  body!: Buffer;
}
