import type { Routes } from '@angular/router';

import { unsavedChangesGuard } from '../../core/unsaved/unsaved-changes-guard';
import { SettingsPage } from './settings-page';

export const SETTINGS_ROUTES = [
  { path: '', title: 'Settings', component: SettingsPage, canDeactivate: [unsavedChangesGuard] },
] satisfies Routes;
