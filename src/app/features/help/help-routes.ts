import type { Routes } from '@angular/router';

import { HelpPage } from './help-page';

export const HELP_ROUTES = [{ path: '', title: 'Help', component: HelpPage }] satisfies Routes;
