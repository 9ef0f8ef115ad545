import type { Routes } from '@angular/router';

import { AccountPage } from './account-page';

export const ACCOUNT_ROUTES = [
  { path: '', title: 'Your account', component: AccountPage },
] satisfies Routes;
