import type { Routes } from '@angular/router';

import { signedInGuard } from './core/session/signed-in-guard';

/** True in development builds only; the optimizer drops what it guards. */
declare const ngDevMode: boolean;

const DEVELOPMENT_ROUTES: Routes = ngDevMode
  ? [
      {
        path: 'gallery',
        loadChildren: () =>
          import('./features/gallery/gallery-routes').then((m) => m.GALLERY_ROUTES),
      },
    ]
  : [];

export const APP_ROUTES: Routes = [
  {
    path: 'sign-in',
    loadChildren: () => import('./features/sign-in/sign-in-routes').then((m) => m.SIGN_IN_ROUTES),
  },
  {
    path: 'set-up',
    loadChildren: () => import('./features/account/set-up-routes').then((m) => m.SET_UP_ROUTES),
  },
  {
    path: 'invitation',
    loadChildren: () =>
      import('./features/account/invitation-routes').then((m) => m.INVITATION_ROUTES),
  },
  ...DEVELOPMENT_ROUTES,
  {
    path: '',
    loadComponent: () => import('./core/shell/shell').then((m) => m.Shell),
    canActivate: [signedInGuard],
    children: [
      { path: '', pathMatch: 'full', redirectTo: 'today' },
      {
        path: 'today',
        loadChildren: () => import('./features/today/today-routes').then((m) => m.TODAY_ROUTES),
      },
      {
        path: 'lasers',
        loadChildren: () => import('./features/lasers/lasers-routes').then((m) => m.LASERS_ROUTES),
      },
      {
        path: 'evaluations',
        loadChildren: () =>
          import('./features/evaluations/evaluations-routes').then((m) => m.EVALUATIONS_ROUTES),
      },
      {
        path: 'bench',
        loadChildren: () =>
          import('./features/evaluations/free-bench-routes').then((m) => m.FREE_BENCH_ROUTES),
      },
      {
        path: 'areas',
        loadChildren: () => import('./features/areas/areas-routes').then((m) => m.AREAS_ROUTES),
      },
      {
        path: 'people',
        loadChildren: () => import('./features/people/people-routes').then((m) => m.PEOPLE_ROUTES),
      },
      {
        path: 'records',
        loadChildren: () =>
          import('./features/records/records-routes').then((m) => m.RECORDS_ROUTES),
      },
      {
        path: 'settings',
        loadChildren: () =>
          import('./features/settings/settings-routes').then((m) => m.SETTINGS_ROUTES),
      },
      {
        path: 'account',
        loadChildren: () =>
          import('./features/account/account-routes').then((m) => m.ACCOUNT_ROUTES),
      },
      {
        path: 'help',
        loadChildren: () => import('./features/help/help-routes').then((m) => m.HELP_ROUTES),
      },
      {
        path: '**',
        title: 'Nothing is here',
        loadComponent: () => import('./core/shell/not-found-page').then((m) => m.NotFoundPage),
      },
    ],
  },
];
