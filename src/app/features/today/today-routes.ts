import type { Routes } from '@angular/router';

import { TodayPage } from './today-page';

export const TODAY_ROUTES = [{ path: '', title: 'Today', component: TodayPage }] satisfies Routes;
