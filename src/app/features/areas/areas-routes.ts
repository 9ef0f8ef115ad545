import type { Routes } from '@angular/router';

import { unsavedChangesGuard } from '../../core/unsaved/unsaved-changes-guard';
import { AreaListPage } from './list/area-list-page';

const form = () => import('./form/area-form-page').then((m) => m.AreaFormPage);

export const AREAS_ROUTES = [
  { path: '', title: 'Areas', component: AreaListPage },
  {
    path: 'new',
    title: 'New area',
    loadComponent: form,
    canDeactivate: [unsavedChangesGuard],
  },
  {
    path: ':id',
    title: 'Area',
    loadComponent: () => import('./detail/area-page').then((m) => m.AreaPage),
  },
  {
    path: ':id/edit',
    title: 'Change an area',
    loadComponent: form,
    canDeactivate: [unsavedChangesGuard],
  },
] satisfies Routes;
