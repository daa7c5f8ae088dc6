import { extname, join } from 'node:path';
import { Piscina } from 'piscina';
import type { ExportPreview } from '../../shared/contracts/projects';
import type { Archive } from './export-archive';
import { packExport, previewExport, type ExportSources } from './export-packing';

export interface ExportRunner {
  pack(sources: ExportSources): Promise<Archive>;
  preview(sources: ExportSources): Promise<ExportPreview>;
  close(): Promise<void>;
}

/**
 * Packs exports in a worker thread of their own, one at a time: a million cells take half a minute. Run from TypeScript,
 * as the tests do, there is no compiled worker and they are packed on the spot.
 */
export function createExportRunner(): ExportRunner {
  if (extname(__filename) === '.ts') return { pack: packExport, preview: previewExport, close: async () => undefined };
  return createPooledExportRunner(join(__dirname, 'export-worker.js'));
}

export function createPooledExportRunner(workerFile: string): ExportRunner {
  const pool = new Piscina({ filename: workerFile, minThreads: 0, maxThreads: 1, idleTimeout: 60_000 });
  return {
    pack: async (sources) => {
      const { bytes, ...rest } = (await pool.run(sources, { name: 'runPacking' })) as Archive;
      // A Buffer arrives from a thread as the plain bytes it is.
      return { ...rest, bytes: Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength) };
    },
    preview: async (sources) => (await pool.run(sources, { name: 'runPreview' })) as ExportPreview,
    close: () => pool.destroy(),
  };
}
