import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

/** A file of an edition's upload under the name it came with. */
@Entity({ name: 'edition_file' })
@Index('edition_file_content', ['teamId', 'sha256'])
export class EditionFile {
  @PrimaryColumn('uuid', { name: 'edition_id' })
  editionId!: string;

  @PrimaryColumn('text')
  name!: string;

  @Column('uuid', { name: 'team_id' })
  teamId!: string;

  @Column('text')
  sha256!: string;

  @Column('integer')
  bytes!: number;
}
