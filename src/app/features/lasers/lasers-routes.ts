import type { Routes } from '@angular/router';

import { LaserListPage } from './list/laser-list-page';

export const LASERS_ROUTES = [
  { path: '', title: 'Lasers', component: LaserListPage },
] satisfies Routes;
