import type { Routes } from '@angular/router';

import { AreaListPage } from './area-list-page';

export const AREAS_ROUTES = [{ path: '', title: 'Areas', component: AreaListPage }] satisfies Routes;
