import type { Routes } from '@angular/router';
import { roleOnly } from './session/role-only';
import { signedInOnly } from './session/signed-in-only';

export const appRoutes: Routes = [
  { path: 'sign-in', title: 'Sign in', loadComponent: () => import('./session/sign-in-page').then((file) => file.SignInPage) },
  { path: 'invitation', title: 'Invitation', loadComponent: () => import('./session/invitation-page').then((file) => file.InvitationPage) },
  { path: 'forgotten-password', title: 'Forgotten password', loadComponent: () => import('./session/forgotten-password-page').then((file) => file.ForgottenPasswordPage) },
  { path: 'new-password', title: 'New password', loadComponent: () => import('./session/new-password-page').then((file) => file.NewPasswordPage) },
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
      { path: 'team/audit', title: 'Audit log', canActivate: [roleOnly('administrator')], loadComponent: () => import('./team/audit-page').then((file) => file.AuditPage) },
      { path: 'account', title: 'Account', loadComponent: () => import('./team/account-page').then((file) => file.AccountPage) },
      { path: 'letters', title: 'Letters', canActivate: [roleOnly('administrator')], loadComponent: () => import('./session/letters-page').then((file) => file.LettersPage) },
      { path: 'not-for-you', title: 'Not for your role', loadComponent: () => import('./shell/not-for-you').then((file) => file.NotForYou) },
      { path: '**', title: 'Not found', loadComponent: () => import('./shell/not-found').then((file) => file.NotFound) },
    ],
  },
];
