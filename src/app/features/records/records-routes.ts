import type { Routes } from '@angular/router';

import { RecordsPage } from './records-page';

export const RECORDS_ROUTES = [
  { path: '', title: 'Records', component: RecordsPage },
] satisfies Routes;
