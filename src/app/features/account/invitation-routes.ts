import type { Routes } from '@angular/router';

import { InvitationPage } from './invitation-page';

export const INVITATION_ROUTES = [
  { path: '', title: 'Set your password', component: InvitationPage },
] satisfies Routes;
