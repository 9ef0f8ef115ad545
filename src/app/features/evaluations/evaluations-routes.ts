import type { Routes } from '@angular/router';

import { EvaluationListPage } from './evaluation-list-page';

export const EVALUATIONS_ROUTES = [{ path: '', title: 'Evaluations', component: EvaluationListPage }] satisfies Routes;
