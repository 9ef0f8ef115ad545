import type { Routes } from '@angular/router';

import { unsavedChangesGuard } from '../../core/unsaved/unsaved-changes-guard';

export const EVALUATIONS_ROUTES = [
  {
    path: '',
    title: 'Evaluations',
    loadComponent: () => import('./list/evaluation-list-page').then((m) => m.EvaluationListPage),
  },
  {
    path: ':id',
    title: 'Evaluation',
    loadComponent: () => import('./evaluation/evaluation-page').then((m) => m.EvaluationPage),
    canDeactivate: [unsavedChangesGuard],
  },
] satisfies Routes;
