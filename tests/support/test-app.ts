import { mkdtempSync, rmSync } from 'node:fs';
import { createServer, type Server } from 'node:http';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { pino } from 'pino';

import type { Role } from '@shared/model/people';

import { storePasswordHash } from '../../server/auth/credential-repository';
import { hashPassword } from '../../server/auth/passwords';
import type { Config } from '../../server/config/config';
import { acting, type Actor, type Context, type Edges, SYSTEM } from '../../server/context/context';
import { transact } from '../../server/context/transact';
import { createArea } from '../../server/features/areas/areas-service';
import { createPerson } from '../../server/features/people/people-service';
import { openProduct, type Product } from '../../server/start';
import { FakeClock } from './fake-clock';
import { TestClient } from './test-client';

export const TEST_PASSWORD = 'seven quiet mirrors';

/** One person for each role, and two more supervisors: of the same and of another department. */
const PEOPLE = {
  administrator: ['administrator', undefined],
  lso: ['lso', undefined],
  'deputy-lso': ['deputy-lso', undefined],
  'laser-supervisor': ['laser-supervisor', 'Optics'],
  operator: ['operator', 'Optics'],
  auditor: ['auditor', undefined],
  committee: ['committee', undefined],
  'department-head': ['department-head', 'Optics'],
  'occupational-health': ['occupational-health', undefined],
  'interlock-technician': ['interlock-technician', undefined],
  purchasing: ['purchasing', undefined],
  personnel: ['personnel', undefined],
  colleague: ['laser-supervisor', 'Optics'],
  outsider: ['laser-supervisor', 'Chemistry'],
  'second-lso': ['lso', undefined],
} as const satisfies Record<string, readonly [Role, string | undefined]>;

export type TestPerson = keyof typeof PEOPLE;

/** `own`: of `laser-supervisor`; `near`: of `colleague`, same department; `far`: of `outsider`. */
export type TestArea = 'own' | 'near' | 'far';

export interface TestApp {
  readonly product: Product;
  readonly edges: Edges;
  readonly server: Server;
  readonly clock: FakeClock;
  readonly dataDir: string;
  readonly personIds: Readonly<Record<TestPerson, string>>;
  readonly areaIds: Readonly<Record<TestArea, string>>;
  /** A browser that nobody has signed in with; it has loaded the session. */
  visitor(): Promise<TestClient>;
  signIn(person: TestPerson): Promise<TestClient>;
  /** Calls services directly, in a transaction, as a person. */
  as<T>(person: TestPerson, work: (ctx: Context) => Promise<T>): Promise<T>;
  close(): Promise<void>;
}

/** The real product in this process on a real database file, with a clock that stands still. */
export async function startTestApp(overrides: Partial<Config> = {}): Promise<TestApp> {
  const dataDir = mkdtempSync(join(tmpdir(), 'limen-test-'));
  const clock = new FakeClock();
  const config = testConfig(dataDir, overrides);
  const product = await openProduct(config, { clock: clock.read, log: pino({ level: 'silent' }) });
  const site = await recordSite(product.edges);
  const server = createServer(product.http);
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));

  async function visitor(): Promise<TestClient> {
    const client = new TestClient(server);
    await client.get('/api/session').expect(200);
    return client;
  }
  return {
    product,
    edges: product.edges,
    server,
    clock,
    dataDir,
    ...site,
    visitor,
    signIn: async (person) => {
      const client = await visitor();
      const credentials = { email: emailOf(person), password: TEST_PASSWORD };
      await client.post('/api/session', credentials).expect(200);
      return client;
    },
    as: (person, work) =>
      transact(product.edges, acting(actorOf(person, site.personIds[person]), 'test'), work),
    close: async () => {
      await new Promise((resolve) => server.close(resolve));
      await product.close();
      rmSync(dataDir, { recursive: true });
    },
  };
}

export function testConfig(dataDir: string, overrides: Partial<Config> = {}): Config {
  return {
    production: false,
    port: 0,
    host: '127.0.0.1',
    dataDir,
    publicUrl: 'http://localhost:4200',
    sessionSecret: 'a secret for tests, long enough and with many letters',
    trustedProxies: [],
    logLevel: 'silent',
    rateLimitFactor: 1e6,
    ...overrides,
  };
}

export function emailOf(person: TestPerson): string {
  return `${person}@site.example`;
}

async function recordSite(edges: Edges): Promise<Pick<TestApp, 'personIds' | 'areaIds'>> {
  passwordHash ??= hashPassword(TEST_PASSWORD);
  const hash = await passwordHash;
  return transact(edges, acting(SYSTEM, 'test'), async (ctx) => {
    const personIds: Partial<Record<TestPerson, string>> = {};
    for (const [name, [role, department]] of Object.entries(PEOPLE)) {
      const person = name as TestPerson;
      const input = { name: nameOf(person), email: emailOf(person), department, active: true };
      const { id } = await createPerson(ctx, { ...input, roles: [role] });
      await storePasswordHash(ctx.tx, id, { passwordHash: hash, at: ctx.now.toISOString() });
      personIds[person] = id;
    }
    const ids = personIds as Record<TestPerson, string>;
    const area = async (code: string, department: string, supervisorId: string) => {
      const place = { building: 'Main', room: code, department, supervisorId };
      const { id } = await createArea(ctx, {
        code,
        name: `Lab ${code}`,
        wallDistanceM: 10,
        ...place,
      });
      return id;
    };
    return {
      personIds: ids,
      areaIds: {
        own: await area('T-1', 'Optics', ids['laser-supervisor']),
        near: await area('T-2', 'Optics', ids.colleague),
        far: await area('T-3', 'Chemistry', ids.outsider),
      },
    };
  });
}

/** Made once for all apps of a test file: hashing is slow on purpose. */
let passwordHash: Promise<string> | undefined;

function actorOf(person: TestPerson, id: string): Actor {
  const [role, department] = PEOPLE[person];
  return {
    id,
    name: nameOf(person),
    email: emailOf(person),
    department,
    roles: [role],
    areaIds: [],
  };
}

function nameOf(person: TestPerson): string {
  return `The ${person}`;
}
