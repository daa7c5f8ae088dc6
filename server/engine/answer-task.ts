import { InvalidDesign } from '../../shared/antenna/invalid-design';
import { placeCells } from '../../shared/antenna/place-cells';
import { predictPlaced } from '../../shared/antenna/predict-design';
import { prepareEdition, type PreparedEdition } from '../../shared/antenna/prepare-edition';
import { useKernel } from './kernel/use-kernel';
import type { EngineEdition, PredictionOutcome, PredictionTask } from './prediction-task';
import { RecentMap } from './recent-map';

/** Editions a thread keeps prepared: a team works with few at a time. */
const KEPT_EDITIONS = 6;

/** Answers one task; looks at its stop flag before the first step and between placing the cells and predicting. */
export type TaskAnswerer = (task: PredictionTask) => PredictionOutcome;

export function createTaskAnswerer(): TaskAnswerer {
  useKernel();
  const prepared = new RecentMap<PreparedEdition>(KEPT_EDITIONS);
  const preparedOf = ({ key, edition }: EngineEdition): PreparedEdition => {
    const known = prepared.get(key);
    if (known !== undefined) return known;
    const made = prepareEdition(edition);
    prepared.set(key, made);
    return made;
  };
  return (task) => {
    try {
      return answer(task, task.edition === null ? undefined : preparedOf(task.edition));
    } catch (error) {
      if (error instanceof InvalidDesign) return { kind: 'invalid', faults: error.faults };
      throw error;
    }
  };
}

const isStopped = (task: PredictionTask): boolean => Atomics.load(task.stop, 0) !== 0;

function answer(task: PredictionTask, edition: PreparedEdition | undefined): PredictionOutcome {
  const { design, frequencyGHz, harmonic, cells, cuts, uvSize, uvShift } = task;
  if (isStopped(task)) return { kind: 'stopped' };
  const placed = placeCells(design, edition);
  if (isStopped(task)) return { kind: 'stopped' };
  const include = { cells, cuts: cuts !== undefined && cuts.length > 0 ? cuts : undefined, uv: uvSize === undefined ? undefined : { size: uvSize, shift: uvShift } };
  return { kind: 'predicted', prediction: predictPlaced(placed, { frequencyGHz, harmonic, include }) };
}
