import { settingsInputSchema, settingsSchema } from '@shared/model/settings';

import { json, route } from '../../http/route';
import { changeSettings, readSettings } from './settings-service';

export const SETTINGS_ROUTES = [
  route({
    method: 'get',
    path: '/api/settings',
    action: 'settings.read',
    summary: 'Settings of the site',
    output: json(settingsSchema),
    handler: ({ ctx }) => readSettings(ctx),
  }),
  route({
    method: 'put',
    path: '/api/settings',
    action: 'settings.update',
    summary: 'Change the settings of the site',
    input: { body: settingsInputSchema },
    output: json(settingsSchema),
    versioned: true,
    handler: ({ ctx, body, version }) => changeSettings(ctx, { version, input: body }),
  }),
];
