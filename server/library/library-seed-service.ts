import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { demoActor } from '../accounts/demo-account-service';
import type { MembershipService } from '../teams/membership-service';
import type { PersonService } from '../accounts/person-service';
import type { Ground } from '../database/ground';
import { loadDemoLibrary } from './demo-library';
import type { ImportService } from './import-service';
import type { LibraryService } from './library-service';

interface Parts {
  readonly ground: Pick<Ground, 'transactions'>;
  readonly people: PersonService;
  readonly memberships: MembershipService;
  readonly library: LibraryService;
  readonly imports: ImportService;
}

/** The folder of the project's own cell data, beside the sources and beside the compiled program alike. */
function cellLibraryFolder(): string {
  for (let folder = __dirname; ; folder = dirname(folder)) {
    const candidate = join(folder, 'cell-library');
    if (existsSync(candidate)) return candidate;
    if (dirname(folder) === folder) throw new Error(`there is no cell-library above ${__dirname}`);
  }
}

/** Fills the demonstration team's library, in the name of its lab. */
export async function seedLibrary(parts: Parts): Promise<void> {
  await loadDemoLibrary(await demoActor(parts, 'lab'), { library: parts.library, imports: parts.imports, folder: cellLibraryFolder() });
}
