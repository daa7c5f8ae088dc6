import { ensureDemoAccounts } from './accounts/demo-account-service';
import type { House } from './house';
import { seedLibrary } from './library/library-seed-service';
import { seedProjects } from './projects/project-seed-service';

export interface SeedStep {
  readonly name: string;
  /** Adds what is missing and leaves alone what is there: it runs at every start in demo mode. */
  readonly run: (house: House) => Promise<void>;
}

/** What demo mode fills a new database with, one line each, in order. */
export const seedSteps: readonly SeedStep[] = [
  { name: 'demo accounts', run: (house) => ensureDemoAccounts(house, house.ground.config.demoPassword ?? '') },
  { name: 'cell library', run: seedLibrary },
  { name: 'demo project', run: seedProjects },
];
