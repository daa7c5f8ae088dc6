import { InvalidDesign } from '../../shared/antenna/invalid-design';
import { placeCells, type PlacedDesign } from '../../shared/antenna/place-cells';
import { prepareEdition, type PreparedEdition } from '../../shared/antenna/prepare-edition';
import type { ChunkOutcome, ChunkTask } from './chunk-task';
import { useKernel } from './kernel/use-kernel';
import { RecentMap } from './recent-map';
import type { RunQuestion } from './run-type';
import type { RunKind } from '../../shared/contracts/runs';
import { runTypeOf } from './run-types';

/** Designs a thread keeps placed: chunks of several runs come in turns. A million cells take some 100 MB, so few. */
const KEPT_DESIGNS = 3;

interface Site {
  readonly placed: PlacedDesign;
  readonly edition: PreparedEdition | undefined;
}

class Stopped extends Error {}

/** Computes one chunk after the other, in a thread or wherever it is called. */
export type ChunkAnswerer = (task: ChunkTask) => ChunkOutcome;

export function createChunkAnswerer(): ChunkAnswerer {
  useKernel();
  const sites = new RecentMap<Site>(KEPT_DESIGNS);
  const siteOf = ({ contentHash, design, edition }: ChunkTask): Site => {
    const known = sites.get(contentHash);
    if (known !== undefined) return known;
    const prepared = edition === null ? undefined : prepareEdition(edition.edition);
    const site = { edition: prepared, placed: placeCells(design, prepared) };
    sites.set(contentHash, site);
    return site;
  };
  return (task) => {
    const checkStop = (): void => {
      if (Atomics.load(task.stop, 0) !== 0) throw new Stopped();
    };
    try {
      checkStop();
      const site = siteOf(task);
      checkStop();
      const question = { design: task.design, parameters: task.parameters } as RunQuestion<RunKind>;
      return { kind: 'computed', part: runTypeOf(task.kind).compute({ ...question, ...site, chunk: task.chunk, checkStop }) };
    } catch (error) {
      if (error instanceof Stopped) return { kind: 'stopped' };
      if (error instanceof InvalidDesign) return { kind: 'invalid', faults: error.faults };
      throw error;
    }
  };
}
