import type { Routes } from '@angular/router';

import { LaserListPage } from './laser-list-page';

export const LASERS_ROUTES = [{ path: '', title: 'Lasers', component: LaserListPage }] satisfies Routes;
