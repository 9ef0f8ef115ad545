import { httpResource } from '@angular/common/http';
import { todaySchema } from '@shared/model/today';

/** What waits for the signed-in person. Needs an injection context. */
export function todayResource() {
  return httpResource(() => '/api/today', { parse: (body) => todaySchema.parse(body) });
}
