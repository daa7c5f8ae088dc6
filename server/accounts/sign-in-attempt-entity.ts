import { Column, Entity, PrimaryColumn } from 'typeorm';

/** Consecutive failures for an address, whether or not it has an account: both must behave alike. */
@Entity({ name: 'sign_in_attempt' })
export class SignInAttempt {
  /** SHA-256 of the address, so that the table is no list of who was tried. */
  @PrimaryColumn('text', { name: 'address_hash' })
  addressHash!: string;

  @Column('integer')
  failures!: number;

  @Column('timestamptz', { name: 'next_at' })
  nextAt!: Date;
}
