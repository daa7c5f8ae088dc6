import type { ExportPreview } from '../../shared/contracts/projects';
import type { Archive } from './export-archive';
import { packExport, previewExport, type ExportSources } from './export-packing';

/** Runs in a worker thread. The names of the functions are the names of the pool's tasks. */
export const runPacking = (sources: ExportSources): Promise<Archive> => packExport(sources);

export const runPreview = (sources: ExportSources): Promise<ExportPreview> => previewExport(sources);
