import { expect, it } from 'vitest';

import { RATE_LIMITS } from '../../server/http/rate-limits';
import { startTestApp } from '../support/test-app';

it('one request more than the limit is a 429 with the time to wait, for that person only', async () => {
  const factor = 0.02;
  const app = await startTestApp({ rateLimitFactor: factor });
  try {
    const lso = await app.signIn('lso');
    const most = Math.ceil(RATE_LIMITS.api.most * factor);
    for (let count = 0; count < most; count += 1) await lso.get('/api/areas').expect(200);
    const refused = await lso.get('/api/areas').expect(429);
    expect(refused.body.name).toBe('too-many');
    expect(Number(refused.headers['retry-after'])).toBeGreaterThan(0);
    expect(refused.headers['ratelimit-policy']).toContain('api');
    const auditor = await app.signIn('auditor');
    await auditor.get('/api/areas').expect(200);
  } finally {
    await app.close();
  }
});
