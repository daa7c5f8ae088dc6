import { Column, Entity, Index, PrimaryColumn } from 'typeorm';

@Entity({ name: 'project' })
@Index('project_team', ['teamId'])
export class Project {
  @PrimaryColumn('uuid')
  id!: string;

  @Column('uuid', { name: 'team_id' })
  teamId!: string;

  @Column('text')
  name!: string;

  /** Counts the changes of the project itself; its panels count their own. */
  @Column('integer')
  version!: number;

  /** Demonstration data, to be labelled so. */
  @Column('boolean')
  invented!: boolean;

  @Column('timestamptz', { name: 'created_at' })
  createdAt!: Date;

  @Column('uuid', { name: 'created_by' })
  createdBy!: string;
}
