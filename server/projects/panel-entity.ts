import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

@Entity({ name: 'panel' })
@Index('panel_team_project', ['teamId', 'projectId'])
export class Panel {
  @PrimaryColumn('uuid')
  id!: string;

  @Column('uuid', { name: 'team_id' })
  teamId!: string;

  @Column('uuid', { name: 'project_id' })
  projectId!: string;

  @Column('text')
  name!: string;

  @Column('timestamptz', { name: 'created_at' })
  createdAt!: Date;
}
