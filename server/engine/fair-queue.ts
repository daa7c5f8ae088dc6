import PQueue from 'p-queue';
import { EngineRefusal } from './engine-refusals';

export interface FairQueueLimits {
  /** Works running at the same time. */
  readonly concurrency: number;
  /** Of these, at most so many of one team. */
  readonly perTeam: number;
  /** A team may have so many more waiting; beyond that it is told to come back later. */
  readonly waitingPerTeam: number;
}

export interface WaitOptions {
  /** Higher ones are taken first within the team. */
  readonly priority?: number;
  /** Waits however long the line of its team is: for what the house itself needs. */
  readonly patient?: boolean;
  /** Leaves the line when aborted. */
  readonly signal?: AbortSignal;
}

/** A line for each team before the common one, so that a team that asks for a thousand things delays no other. */
export class FairQueue {
  private readonly common: PQueue;
  private readonly teams = new Map<string, PQueue>();

  constructor(private readonly limits: FairQueueLimits) {
    this.common = new PQueue({ concurrency: limits.concurrency });
  }

  async run<T>(teamId: string, work: () => Promise<T>, { priority = 0, patient = false, signal }: WaitOptions = {}): Promise<T> {
    const line = this.lineOf(teamId);
    if (!patient && line.size >= this.limits.waitingPerTeam) {
      throw new EngineRefusal('busy', `Your team has ${line.size} computations waiting already.`);
    }
    try {
      return await line.add(() => this.common.add(work), { priority, signal });
    } finally {
      if (line.size === 0 && line.pending === 0) this.teams.delete(teamId);
    }
  }

  private lineOf(teamId: string): PQueue {
    const known = this.teams.get(teamId);
    if (known !== undefined) return known;
    const line = new PQueue({ concurrency: this.limits.perTeam });
    this.teams.set(teamId, line);
    return line;
  }
}
