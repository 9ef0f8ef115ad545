import type { Routes } from '@angular/router';

import { SettingsPage } from './settings-page';

export const SETTINGS_ROUTES = [{ path: '', title: 'Settings', component: SettingsPage }] satisfies Routes;
