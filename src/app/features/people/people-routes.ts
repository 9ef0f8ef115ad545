import type { Routes } from '@angular/router';

import { unsavedChangesGuard } from '../../core/unsaved/unsaved-changes-guard';
import { PersonListPage } from './list/person-list-page';

const form = () => import('./form/person-form-page').then((m) => m.PersonFormPage);

export const PEOPLE_ROUTES = [
  { path: '', title: 'People', component: PersonListPage },
  {
    path: 'new',
    title: 'New person',
    loadComponent: form,
    canDeactivate: [unsavedChangesGuard],
  },
  { path: ':id', title: 'Person', loadComponent: form, canDeactivate: [unsavedChangesGuard] },
] satisfies Routes;
