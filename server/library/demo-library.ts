import { readFile, readdir } from 'node:fs/promises';
import { join } from 'node:path';
import { familyDescription } from '../../shared/model/cell-family';
import type { ImportService } from './import-service';
import type { LibraryService } from './library-service';
import type { NamedBytes } from './upload-archive';

/** Files of a family folder that are prose or its description, not data. */
const NOT_DATA = new Set(['family.json', 'README.md', 'faults.csv']);

export interface DemoFamily {
  readonly folder: string;
  readonly acceptNote: string;
  readonly publishNote: string | null;
}

/** What the demonstration laboratory has accepted and published, in this order. */
export const demoFamilies: readonly DemoFamily[] = [
  family('square-patch-15', 'Simulated at normal incidence; independent solver within 2.9 degrees.'),
  family('square-patch-15-oblique', 'Simulated against angle; regions not to use are entered.'),
  family('square-patch-5-oblique', 'Simulated against angle; conductor loss is not included.'),
  family('ring-and-patch-5', 'Simulated at normal incidence; covers more than 360 degrees.'),
  family('four-state-5', 'Four cells of the ring-and-patch family, about 90 degrees apart.'),
  family('rectangular-patch-15', 'Simulated in both polarisations; port 1 is x, port 2 is y.'),
  {
    folder: 'square-patch-15-laboratory',
    acceptNote: 'Invented laboratory-like data with known faults, for practising the quality checks. Not published.',
    publishNote: null,
  },
];

function family(folder: string, note: string): DemoFamily {
  return { folder, acceptNote: note, publishNote: note };
}

interface DemoLibraryParts {
  readonly library: LibraryService;
  readonly imports: ImportService;
  /** The folder `cell-library` of the project. */
  readonly folder: string;
}

/** Loads the families of `cell-library` for a team, leaving alone those it has. */
export async function loadDemoLibrary(actor: { teamId: string; person: { id: string } }, parts: DemoLibraryParts): Promise<void> {
  const known = new Set((await parts.library.list(actor.teamId, {})).map((summary) => summary.name));
  for (const demo of demoFamilies) {
    const path = join(parts.folder, demo.folder);
    const description = familyDescription.parse(JSON.parse(await readFile(join(path, 'family.json'), 'utf8')));
    if (known.has(description.name)) continue;
    const edition = await parts.imports.accept(actor, null, await dataFiles(path), { description, mapping: {}, note: demo.acceptNote });
    if (demo.publishNote !== null) await parts.imports.publish(actor, edition.id, demo.publishNote);
  }
}

async function dataFiles(path: string): Promise<NamedBytes[]> {
  const names = (await readdir(path)).filter((name) => !NOT_DATA.has(name)).sort();
  return Promise.all(names.map(async (name) => ({ name, bytes: new Uint8Array(await readFile(join(path, name))) })));
}
