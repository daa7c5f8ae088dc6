import { randomUUID } from 'node:crypto';
import { hostname } from 'node:os';
import type { Ground } from '../database/ground';
import { WORKER_SILENCE_MS } from './run-dispatch-service';
import { RunWorkerRepository } from './run-worker-repository';

/** Who is there to compute. */
export class RunRosterService {
  private readonly workers = new RunWorkerRepository();
  private readonly id = randomUUID();
  /** Of this process: machine and process id. */
  readonly name = `${hostname()}:${process.pid}`;

  constructor(private readonly ground: Pick<Ground, 'transactions' | 'now'>) {}

  /** Says that this worker is there; to be repeated well within the silence after which it is taken for gone. */
  async see(threads: number): Promise<void> {
    const seenAt = this.ground.now();
    await this.ground.transactions.run(async (transaction) => {
      await this.workers.see(transaction, { id: this.id, name: this.name, threads, seenAt });
      await this.workers.removeUnseenSince(transaction, new Date(seenAt.getTime() - 4 * WORKER_SILENCE_MS));
    });
  }

  async leave(): Promise<void> {
    await this.ground.transactions.run((transaction) => this.workers.remove(transaction, this.id));
  }
}
