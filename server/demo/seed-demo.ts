import { acting, type Edges, reading, SYSTEM } from '../context/context';
import { transact } from '../context/transact';
import { readPeople } from '../features/people/people-service';
import { seedInstitute, seedLeavers } from './demo-institute';
import { seedLasers } from './seed-lasers';

export async function isEmpty(edges: Edges): Promise<boolean> {
  const people = await readPeople(reading(edges, acting(SYSTEM, 'demo')), { limit: 1 });
  return people.total === 0;
}

/** Fills an empty database with the demo institute: all of it or nothing. Never in production. */
export async function seedDemo(edges: Edges): Promise<void> {
  if (edges.config.production) throw new Error('The demo institute is not for production.');
  await transact(edges, acting(SYSTEM, 'demo'), async (ctx) => {
    const institute = await seedInstitute(ctx);
    await seedLasers(institute);
    await seedLeavers(institute);
  });
}
