/** Whole predictions as a thread of the engine answers them: what a person waits for while steering, less the way to the browser. */
import { createHash } from 'node:crypto';
import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';

const library = join(import.meta.dirname, '../../cell-library');

/** An edition of the library, assembled from its files as the import does. */
function libraryEdition(load, folder) {
  const { inspectFamilyFiles } = load('files/family-import');
  const { assembleEdition } = load('files/edition-assembly');
  const { familyDescription } = load('model/cell-family');
  const files = readdirSync(join(library, folder)).map((name) => {
    const bytes = new Uint8Array(readFileSync(join(library, folder, name)));
    return { name, bytes, sha256: createHash('sha256').update(bytes).digest('hex') };
  });
  const description = familyDescription.parse(JSON.parse(readFileSync(join(library, folder, 'family.json'), 'utf8')));
  const assembled = assembleEdition(inspectFamilyFiles(files), description);
  if (assembled.kind === 'refused') throw new Error(`The family ${folder} is refused: ${JSON.stringify(assembled.messages)}`);
  return assembled.edition;
}

const editionId = '00000000-0000-4000-8000-000000000001';
const cuts = ['along', 'across'].map((plane) => ({ plane, angleDeg: [-90, 90, 0.25] }));

/** Answers with the beam at another angle each time; the horn moves back with the size of the panel, so that it lights every size alike. */
function steering(load, side, { uvSize, folder }) {
  const { createTaskAnswerer } = load('server/engine/answer-task');
  const { STARTING_DESIGN } = load('model/starting-design');
  const answerTask = createTaskAnswerer();
  const edition = folder === undefined ? null : { key: folder, edition: libraryEdition(load, folder) };
  const { requirement, panel, illumination } = STARTING_DESIGN;
  const sideMm = side * 5;
  const design = (thetaDeg) => ({
    ...STARTING_DESIGN,
    requirement: { ...requirement, beams: [{ thetaDeg, phiDeg: 0 }] },
    panel: { ...panel, outline: { kind: 'rectangle', widthMm: sideMm, heightMm: sideMm } },
    illumination: { ...illumination, positionMm: illumination.positionMm.map((mm) => (mm * sideMm) / 200) },
    ...(edition === null ? {} : { cells: { kind: 'edition', editionId, excludedCells: [], rule: 'nearest-phase' } }),
  });
  const stop = new Int32Array(new SharedArrayBuffer(4));
  return (i) => {
    const outcome = answerTask({ design: design(10 + (i % 200) * 0.1), edition, cells: true, cuts, uvSize, stop });
    if (outcome.kind !== 'predicted') throw new Error(`The prediction is ${outcome.kind}: ${JSON.stringify(outcome.faults)}`);
  };
}

export const rows = [
  {
    name: '10⁶ cells of a library edition, first answer',
    goal: { wallMs: 2000, rssMb: 600 },
    prepare: (load) => {
      const answer = steering(load, 1000, { folder: 'square-patch-5-oblique' });
      return { work: () => answer(0) };
    },
  },
  { name: 'steering in the engine, 40 x 40', goal: { p95Ms: 60, calls: 100 }, prepare: (load) => ({ work: steering(load, 40, { uvSize: 101 }) }) },
  {
    name: 'steering in the engine, 100 x 100 of a library edition',
    goal: { p95Ms: 150, calls: 30 },
    prepare: (load) => ({ work: steering(load, 100, { uvSize: 101, folder: 'square-patch-5-oblique' }) }),
  },
];
