import { todaySchema } from '@shared/model/today';

import { json, route } from '../../http/route';
import { readToday } from './today-service';

export const TODAY_ROUTES = [
  route({
    method: 'get',
    path: '/api/today',
    action: 'today.read',
    summary: 'What waits for the signed-in person',
    output: json(todaySchema),
    handler: ({ ctx }) => readToday(ctx),
  }),
];
