import { Column, Entity, PrimaryColumn } from 'typeorm';

/** Original bytes by their hash, once per team. Never changed; removed only with the last edition that was never published. */
@Entity({ name: 'kept_file' })
export class KeptFile {
  @PrimaryColumn('uuid', { name: 'team_id' })
  teamId!: string;

  @PrimaryColumn('text')
  sha256!: string;

  @Column('bytea')
  body!: Buffer;
}
