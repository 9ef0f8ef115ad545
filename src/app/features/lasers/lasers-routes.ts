import type { Routes } from '@angular/router';

import { unsavedChangesGuard } from '../../core/unsaved/unsaved-changes-guard';
import { LaserListPage } from './list/laser-list-page';

const form = () => import('./form/laser-form-page').then((m) => m.LaserFormPage);

export const LASERS_ROUTES = [
  { path: '', title: 'Lasers', component: LaserListPage },
  {
    path: 'new',
    title: 'Register a laser',
    loadComponent: form,
    canDeactivate: [unsavedChangesGuard],
  },
  {
    path: 'found',
    title: 'Declare a laser found',
    loadComponent: form,
    data: { found: true },
    canDeactivate: [unsavedChangesGuard],
  },
  {
    path: 'import',
    title: 'Import lasers',
    loadComponent: () => import('./import/laser-import-page').then((m) => m.LaserImportPage),
  },
  {
    path: ':id',
    title: 'Laser',
    loadComponent: () => import('./detail/laser-page').then((m) => m.LaserPage),
  },
  {
    path: ':id/edit',
    title: 'Change a laser',
    loadComponent: form,
    canDeactivate: [unsavedChangesGuard],
  },
] satisfies Routes;
