import type { Routes } from '@angular/router';

/** Below /library. */
export const LIBRARY_ROUTES: Routes = [
  { path: '', title: 'Library', loadComponent: () => import('./library-page').then((file) => file.LibraryPage) },
  { path: 'import', title: 'Import a family', loadComponent: () => import('./import-page').then((file) => file.ImportPage) },
  { path: 'families/:familyId', title: 'Family', loadComponent: () => import('./family-page').then((file) => file.FamilyPage) },
  { path: 'editions/:editionId', title: 'Edition', loadComponent: () => import('./edition-page').then((file) => file.EditionPage) },
];
