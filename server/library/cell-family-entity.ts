import { Column, Entity, Index, PrimaryColumn, Unique } from 'typeorm';

/** A family of cells by its name; what it is stands in its editions. */
@Entity({ name: 'cell_family' })
@Unique('cell_family_name', ['teamId', 'name'])
@Index('cell_family_team', ['teamId'])
export class CellFamily {
  @PrimaryColumn('uuid')
  id!: string;

  @Column('uuid', { name: 'team_id' })
  teamId!: string;

  @Column('text')
  name!: string;

  @Column('timestamptz', { name: 'created_at' })
  createdAt!: Date;
}
