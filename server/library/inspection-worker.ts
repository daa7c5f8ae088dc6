import { inspectUpload, type UploadReading, type UploadRequest } from './inspect-upload';
import type { NamedBytes } from './upload-archive';

export interface InspectionTask {
  readonly files: readonly NamedBytes[];
  readonly request: UploadRequest;
}

/** Runs in a worker thread. The name of the file is the name of the pool's task. */
export function runInspection(task: InspectionTask): UploadReading {
  return inspectUpload(task.files, task.request);
}
