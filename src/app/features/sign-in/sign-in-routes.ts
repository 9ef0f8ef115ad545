import type { Routes } from '@angular/router';

import { SignInPage } from './sign-in-page';

export const SIGN_IN_ROUTES = [
  { path: '', title: 'Sign in', component: SignInPage },
] satisfies Routes;
