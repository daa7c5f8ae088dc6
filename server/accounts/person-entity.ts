import { Column, Entity, PrimaryColumn, Unique } from 'typeorm';

/** Someone with an address and a password. What a person may do is said per team, in the membership. */
@Entity({ name: 'person' })
@Unique('person_email', ['email'])
export class Person {
  @PrimaryColumn('uuid')
  id!: string;

  /** Lower case; unique. */
  @Column('text')
  email!: string;

  @Column('text')
  name!: string;

  /** Encoded with its parameters: see password-hash.ts. */
  @Column('text', { name: 'password_hash' })
  passwordHash!: string;

  @Column('timestamptz', { name: 'created_at' })
  createdAt!: Date;
}
