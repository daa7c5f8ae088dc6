import type { Routes } from '@angular/router';

/** Below /panels/:panelId. */
export const WORKSPACE_ROUTES: Routes = [
  {
    path: '',
    loadComponent: () => import('./workspace-page').then((file) => file.WorkspacePage),
    children: [
      { path: '', pathMatch: 'full', redirectTo: 'requirement' },
      { path: 'requirement', title: 'Requirement', loadComponent: () => import('./requirement/requirement-sheet').then((file) => file.RequirementSheet) },
      { path: 'panel', title: 'Panel', loadComponent: () => import('./panel/panel-sheet').then((file) => file.PanelSheet) },
      { path: 'illumination', title: 'Illumination', loadComponent: () => import('./illumination/illumination-sheet').then((file) => file.IlluminationSheet) },
      { path: 'cells', title: 'Cells', loadComponent: () => import('./cells/cells-sheet').then((file) => file.CellsSheet) },
      { path: 'phase', title: 'Phase', loadComponent: () => import('./phase/phase-sheet').then((file) => file.PhaseSheet) },
      { path: 'pattern', title: 'Pattern', loadComponent: () => import('./pattern/pattern-sheet').then((file) => file.PatternSheet) },
      { path: 'band', title: 'Band', loadComponent: () => import('./band/band-sheet').then((file) => file.BandSheet) },
      { path: 'tolerance', title: 'Tolerance', loadComponent: () => import('./tolerance/tolerance-sheet').then((file) => file.ToleranceSheet) },
      { path: 'revisions', title: 'Revisions', loadComponent: () => import('./revisions/revisions-sheet').then((file) => file.RevisionsSheet) },
      { path: 'revisions/compare', title: 'Compare revisions', loadComponent: () => import('./revisions/revision-compare').then((file) => file.RevisionCompare) },
    ],
  },
];
