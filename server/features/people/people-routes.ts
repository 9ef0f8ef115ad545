import {
  invitationSchema,
  personInputSchema,
  personListQuerySchema,
  personPageSchema,
  personSchema,
} from '@shared/model/people';

import { idParams, json, route } from '../../http/route';
import { changePerson, createPerson, invitePerson, readPeople, readPerson } from './people-service';

export const PEOPLE_ROUTES = [
  route({
    method: 'get',
    path: '/api/people',
    action: 'person.list',
    summary: 'People by name',
    input: { query: personListQuerySchema },
    output: json(personPageSchema),
    handler: ({ ctx, query }) => readPeople(ctx, query),
  }),
  route({
    method: 'post',
    path: '/api/people',
    action: 'person.create',
    summary: 'Record a person and make an invitation',
    input: { body: personInputSchema },
    output: json(invitationSchema),
    status: 201,
    location: ({ person }) => `/api/people/${person.id}`,
    handler: async ({ ctx, body }) => {
      const person = await createPerson(ctx, body);
      return invitePerson(ctx, person.id);
    },
  }),
  route({
    method: 'get',
    path: '/api/people/:id',
    action: 'person.list',
    summary: 'One person',
    input: { params: idParams },
    output: json(personSchema),
    handler: ({ ctx, params }) => readPerson(ctx, params.id),
  }),
  route({
    method: 'put',
    path: '/api/people/:id',
    action: 'person.update',
    summary: 'Change a person; new roles end the sessions of that person',
    input: { params: idParams, body: personInputSchema },
    output: json(personSchema),
    versioned: true,
    handler: ({ ctx, params, body, version }) =>
      changePerson(ctx, params.id, { version, input: body }),
  }),
  route({
    method: 'post',
    path: '/api/people/:id/invitation',
    action: 'person.invite',
    summary: 'Make a new invitation, shown once; earlier ones end',
    input: { params: idParams },
    output: json(invitationSchema),
    status: 201,
    handler: ({ ctx, params }) => invitePerson(ctx, params.id),
  }),
];
