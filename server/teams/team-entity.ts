import { Column, Entity, PrimaryColumn } from 'typeorm';

@Entity({ name: 'team' })
export class Team {
  @PrimaryColumn('uuid')
  id!: string;

  @Column('text')
  name!: string;

  @Column('timestamptz', { name: 'created_at' })
  createdAt!: Date;
}
