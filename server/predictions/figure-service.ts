import type { FiguresSummary } from '../../shared/contracts/projects';
import type { DesignDocument } from '../../shared/model/design-document';
import type { Figures, Verdict, VerdictWord, Warning } from '../../shared/model/figures';
import type { Ground } from '../database/ground';
import { ENGINE_VERSION } from '../engine/engine-version';
import { InvalidInput } from '../http/problems';
import type { PredictionService } from './prediction-service';
import { ResultRepository, type ResultKey } from './result-repository';

/** A design with the hash of everything its figures depend on. */
export interface HashedDesign {
  readonly design: DesignDocument;
  readonly hash: string;
}

export interface FigureSet {
  readonly figures: Figures;
  readonly verdicts: Verdict[];
  readonly warnings: Warning[];
}

/** What a list says of a design. */
export interface Headline {
  /** Null when the design cannot be predicted, or is still being predicted. */
  readonly summary: FiguresSummary | null;
  readonly summaryPending?: true;
}

const LIST_PATIENCE_MS = 3000;
const KEPT_DAYS = 90;
const DAY_MS = 24 * 3600 * 1000;

/** Figures of designs by their content: computed once, then read. */
export class FigureService {
  private readonly results = new ResultRepository();
  /** Computations under way, so that two who ask at once share one. */
  private readonly running = new Map<string, Promise<FigureSet>>();

  constructor(
    private readonly ground: Pick<Ground, 'transactions' | 'now'>,
    private readonly predictions: Pick<PredictionService, 'predict'>,
    private readonly listPatienceMs = LIST_PATIENCE_MS,
  ) {}

  /** @throws InvalidInput when the design cannot be predicted */
  async figuresOf(teamId: string, { design, hash }: HashedDesign): Promise<FigureSet> {
    const name = `${teamId} ${hash}`;
    const underWay = this.running.get(name) ?? this.readOrCompute({ teamId, contentHash: hash, kind: 'figures', engineVersion: ENGINE_VERSION }, design);
    this.running.set(name, underWay);
    try {
      return await underWay;
    } finally {
      this.running.delete(name);
    }
  }

  /**
   * Headline figures for a list, in the order of the designs. The list waits only so long for what nobody has computed
   * yet: that goes on, is said to be pending, and the next list has it.
   */
  async headlinesOf(teamId: string, designs: readonly HashedDesign[]): Promise<Headline[]> {
    let timer: NodeJS.Timeout | undefined;
    const late = new Promise<Headline>((resolve) => {
      timer = setTimeout(() => resolve({ summary: null, summaryPending: true }), this.listPatienceMs);
    });
    try {
      return await Promise.all(designs.map((design) => Promise.race([this.headlineOf(teamId, design), late])));
    } finally {
      clearTimeout(timer);
    }
  }

  private async headlineOf(teamId: string, design: HashedDesign): Promise<Headline> {
    return { summary: await this.summaryOf(teamId, design) };
  }

  /** Null when the design cannot be predicted. */
  private async summaryOf(teamId: string, hashed: HashedDesign): Promise<FiguresSummary | null> {
    try {
      return summary(await this.figuresOf(teamId, hashed));
    } catch (error) {
      if (error instanceof InvalidInput) return null;
      throw error;
    }
  }

  /** Drops what was computed long ago. */
  async sweep(): Promise<void> {
    const before = new Date(this.ground.now().getTime() - KEPT_DAYS * DAY_MS);
    await this.ground.transactions.run((transaction) => this.results.removeOlderThan(transaction, before));
  }

  private async readOrCompute(key: ResultKey, design: DesignDocument): Promise<FigureSet> {
    const { transactions, now } = this.ground;
    const kept = await transactions.read((transaction) => this.results.find(transaction, key));
    if (kept !== null) return kept.body as FigureSet;
    const { figures, verdicts, warnings } = await this.predictions.predict(key.teamId, { design, patient: true });
    const body: FigureSet = { figures, verdicts, warnings };
    await transactions.run((transaction) => this.results.keep(transaction, { ...key, body, createdAt: now() }));
    return body;
  }
}

function summary({ figures, verdicts, warnings }: FigureSet): FiguresSummary {
  const remarks = warnings.filter(({ severity }) => severity !== 'note').map(({ pointer, severity, message }) => ({ pointer, severity, message }));
  return { cellCount: figures.cellCount, gainDbi: figures.gainDbi, verdicts, overall: overallVerdict(verdicts), remarks };
}

/** The worst of the verdicts; what was not evaluated is worse than what meets, and no line at all is not evaluated. */
export function overallVerdict(verdicts: readonly Verdict[]): VerdictWord {
  const words = verdicts.map(({ verdict }) => verdict);
  if (words.includes('falls-short')) return 'falls-short';
  return words.length === 0 || words.includes('not-evaluated') ? 'not-evaluated' : 'meets';
}
