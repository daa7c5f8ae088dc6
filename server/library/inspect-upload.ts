import { createHash } from 'node:crypto';
import type { Inspection, ImportMapping } from '../../shared/contracts/library';
import { judgeEdition } from '../../shared/antenna/cell-quality';
import { assembleEdition } from '../../shared/files/edition-assembly';
import type { FamilyCurve, NamedFile } from '../../shared/files/family-inspection';
import { inspectFamilyFiles } from '../../shared/files/family-import';
import { unwrapPhasesRad } from '../../shared/math/unwrap-phase';
import type { CellEdition, FamilyDescription } from '../../shared/model/cell-family';
import type { NamedBytes } from './upload-archive';

export interface UploadReading {
  readonly inspection: Inspection;
  /** Present when nothing but the acceptance is missing. */
  readonly edition: CellEdition | null;
}

export interface UploadRequest {
  readonly mapping?: ImportMapping;
  readonly description?: FamilyDescription;
}

/** Curves beyond this many are left out of the preview, not of the import. */
const PREVIEW_CELLS = 200;

export const sha256Of = (bytes: Uint8Array): string => createHash('sha256').update(bytes).digest('hex');

/** Reads the files of an upload as far as they and the request allow. Pure but for its time: keep it off the main thread. */
export function inspectUpload(files: readonly NamedBytes[], request: UploadRequest): UploadReading {
  const named: NamedFile[] = files.map((file) => ({ ...file, sha256: sha256Of(file.bytes) }));
  const inspected = inspectFamilyFiles(named, request.mapping);
  const assembled = request.description === undefined ? null : assembleEdition(inspected, request.description);
  const edition = assembled?.kind === 'edition' ? assembled.edition : null;
  const refusals = assembled?.kind === 'refused' ? assembled.messages : [];
  const notices = assembled?.kind === 'edition' ? assembled.messages : [];
  const { inspection } = inspected;
  const anyRefused = inspection.files.some((file) => file.status === 'refused');
  return {
    // The reading's types say `readonly` where the reply's do not; nothing changes them on the way.
    inspection: {
      ...(inspection as unknown as Pick<Inspection, 'files' | 'detected'>),
      messages: [...inspection.messages, ...notices],
      quality: assembled?.kind === 'edition' ? judgeEdition(assembled.edition, assembled.origin) : null,
      refusals: [...refusals],
      preview: previewOf(inspected.curves),
      acceptable: edition !== null && !anyRefused,
    },
    edition: anyRefused ? null : edition,
  };
}

/** The response of each cell at its smallest angles. Cells on another frequency grid than the first are left out. */
function previewOf(curves: readonly FamilyCurve[]): Inspection['preview'] {
  const first = new Map<string, FamilyCurve>();
  for (const curve of curves) {
    const known = first.get(curve.cellId);
    if (known === undefined || curve.thetaDeg < known.thetaDeg || (curve.thetaDeg === known.thetaDeg && curve.phiDeg < known.phiDeg)) {
      first.set(curve.cellId, curve);
    }
  }
  const shown = [...first.values()];
  const grid = shown[0]?.frequenciesHz;
  if (grid === undefined) return null;
  const alike = shown.filter((curve) => curve.frequenciesHz.length === grid.length).slice(0, PREVIEW_CELLS);
  return { frequenciesGHz: Array.from(grid, (hz) => hz / 1e9), cells: alike.map(previewCurve) };
}

function previewCurve(curve: FamilyCurve): { cellId: string; phaseDeg: number[]; magnitudeDb: number[] } {
  const stride = 2 * curve.portCount ** 2;
  const count = curve.frequenciesHz.length;
  const phaseRad = new Float64Array(count);
  const magnitudeDb: number[] = [];
  for (let i = 0; i < count; i += 1) {
    const re = curve.values[i * stride] ?? 0;
    const im = curve.values[i * stride + 1] ?? 0;
    phaseRad[i] = Math.atan2(im, re);
    magnitudeDb.push(Math.max(-200, 20 * Math.log10(Math.hypot(re, im))));
  }
  return { cellId: curve.cellId, phaseDeg: Array.from(unwrapPhasesRad(phaseRad), (rad) => (rad * 180) / Math.PI), magnitudeDb };
}
