import type { Evaluation } from '@shared/model/evaluations';
import { type Laser, type LaserInput, laserInputSchema } from '@shared/model/lasers';

import { answered } from './laser-builders';
import { TEST_PASSWORD, type TestApp } from './test-app';
import type { TestClient } from './test-client';

/** The people of the main job, signed in. */
export interface Team {
  readonly supervisor: TestClient;
  readonly lso: TestClient;
  readonly deputy: TestClient;
}

export async function signInTeam(app: TestApp): Promise<Team> {
  return {
    supervisor: await app.signIn('laser-supervisor'),
    lso: await app.signIn('lso'),
    deputy: await app.signIn('deputy-lso'),
  };
}

export async function register(client: TestClient, input: LaserInput): Promise<Laser> {
  return (await client.post('/api/lasers', input).expect(201)).body;
}

export async function readLaser(client: TestClient, id: string): Promise<Laser> {
  return (await client.get(`/api/lasers/${id}`).expect(200)).body;
}

export async function readEvaluation(client: TestClient, id: string): Promise<Evaluation> {
  return (await client.get(`/api/evaluations/${id}`).expect(200)).body;
}

/** A step of a laser from its present version. */
export async function stepLaser(
  client: TestClient,
  id: string,
  step: object,
  status = 200,
): Promise<Laser> {
  const { version } = await readLaser(client, id);
  return (await client.post(`/api/lasers/${id}/transitions`, step, version).expect(status)).body;
}

/** A step of an evaluation from its present version, with the proof of presence. */
export async function stepEvaluation(
  client: TestClient,
  id: string,
  step: object,
  status = 200,
): Promise<Evaluation> {
  const { version } = await readEvaluation(client, id);
  const path = `/api/evaluations/${id}/transitions`;
  return (await client.post(path, step, version).expect(status)).body;
}

/** The stored input of a laser, as a form would send it back. */
export function inputOf(laser: Laser): LaserInput {
  const fields = Object.keys(laserInputSchema.shape);
  const own = Object.entries(laser).filter(([field]) => fields.includes(field));
  return Object.fromEntries(own) as LaserInput;
}

/** Submitted by the supervisor, class verified and evaluation opened by the LSO. */
export async function openForEvaluation(team: Team, laserId: string): Promise<Laser> {
  await stepLaser(team.supervisor, laserId, { event: 'submit-record' });
  const registered = await readLaser(team.lso, laserId);
  const input = { ...inputOf(registered), verifiedClass: registered.declaredClass };
  await team.lso.put(`/api/lasers/${laserId}`, input, registered.version).expect(200);
  return stepLaser(team.lso, laserId, { event: 'open-evaluation' });
}

/** A complete draft by the supervisor. */
export async function draft(team: Team, laserId: string): Promise<Evaluation> {
  const { body } = await team.supervisor.post('/api/evaluations', { laserId }).expect(201);
  const path = `/api/evaluations/${body.id}`;
  const saved = await team.supervisor.put(path, answered(body.input), body.version).expect(200);
  return saved.body;
}

/** From the draft to the signature: the supervisor authors, the LSO checks and signs. */
export async function signed(team: Team, laserId: string): Promise<Evaluation> {
  const { id } = await draft(team, laserId);
  const password = TEST_PASSWORD;
  await stepEvaluation(team.supervisor, id, { event: 'send-to-check' });
  await stepEvaluation(team.lso, id, { event: 'confirm', password });
  return stepEvaluation(team.lso, id, { event: 'sign', password });
}

export const PASSWORD = TEST_PASSWORD;
