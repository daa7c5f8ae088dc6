import type { Routes } from '@angular/router';
import { signedInOnly } from './session/signed-in-only';

export const appRoutes: Routes = [
  { path: 'sign-in', title: 'Sign in', loadComponent: () => import('./session/sign-in-page').then((file) => file.SignInPage) },
  { path: 'invitation', title: 'Invitation', loadComponent: () => import('./session/invitation-page').then((file) => file.InvitationPage) },
  { path: 'forgotten-password', title: 'Forgotten password', loadComponent: () => import('./session/forgotten-password-page').then((file) => file.ForgottenPasswordPage) },
  { path: 'new-password', title: 'New password', loadComponent: () => import('./session/new-password-page').then((file) => file.NewPasswordPage) },
  { path: 'letters', title: 'Letters', loadComponent: () => import('./session/letters-page').then((file) => file.LettersPage) },
  {
    path: 'panels/:panelId',
    canActivate: [signedInOnly],
    loadChildren: () => import('./workspace/workspace-routes').then((file) => file.WORKSPACE_ROUTES),
  },
  {
    path: '',
    canActivate: [signedInOnly],
    loadComponent: () => import('./shell/shell').then((file) => file.Shell),
    children: [
      { path: '', pathMatch: 'full', redirectTo: 'projects' },
      { path: 'projects', title: 'Projects', loadComponent: () => import('./projects/projects-page').then((file) => file.ProjectsPage) },
      { path: 'library', loadChildren: () => import('./library/library-routes').then((file) => file.LIBRARY_ROUTES) },
      { path: 'team', title: 'Team', loadComponent: () => import('./team/team-page').then((file) => file.TeamPage) },
      { path: 'team/audit', title: 'Audit log', loadComponent: () => import('./team/audit-page').then((file) => file.AuditPage) },
      { path: 'account', title: 'Account', loadComponent: () => import('./team/account-page').then((file) => file.AccountPage) },
      { path: '**', title: 'Not found', loadComponent: () => import('./shell/not-found').then((file) => file.NotFound) },
    ],
  },
];
