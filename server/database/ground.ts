import type { Logger } from 'pino';
import type { Config } from '../config';
import type { TransactionRunner } from './transaction-runner';

/** What the services of every feature stand on. */
export interface Ground {
  readonly config: Config;
  readonly logger: Logger;
  readonly transactions: TransactionRunner;
  /** Time comes from here, so that tests can move it. */
  readonly now: () => Date;
}
