import type { Routes } from '@angular/router';

import { SetUpPage } from './set-up-page';

export const SET_UP_ROUTES = [
  { path: '', title: 'Set up this site', component: SetUpPage },
] satisfies Routes;
