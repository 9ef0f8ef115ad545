import {
  beginEvaluationSchema,
  evaluationInputSchema,
  evaluationListQuerySchema,
  evaluationPageSchema,
  evaluationSchema,
  evaluationTransitionSchema,
} from '@shared/model/evaluations';

import { file, idParams, json, route } from '../../http/route';
import {
  beginEvaluation,
  changeEvaluation,
  readEvaluation,
  readEvaluations,
  readSeal,
  refreshInputs,
  transitionEvaluation,
} from './evaluation-service';

const MAX_EVALUATION_BYTES = 500_000;

export const EVALUATIONS_ROUTES = [
  route({
    method: 'get',
    path: '/api/evaluations',
    action: 'evaluation.read',
    summary: 'Evaluations, the last changed first',
    input: { query: evaluationListQuerySchema },
    output: json(evaluationPageSchema),
    handler: ({ ctx, query }) => readEvaluations(ctx, query),
  }),
  route({
    method: 'post',
    path: '/api/evaluations',
    action: 'evaluation.begin',
    summary: 'Begin an evaluation of a laser',
    input: { body: beginEvaluationSchema },
    output: json(evaluationSchema),
    status: 201,
    location: ({ id }) => `/api/evaluations/${id}`,
    handler: ({ ctx, body }) => beginEvaluation(ctx, body),
  }),
  route({
    method: 'get',
    path: '/api/evaluations/:id',
    action: 'evaluation.read',
    summary: 'One evaluation, its signatures and seal verified now',
    input: { params: idParams },
    output: json(evaluationSchema),
    handler: ({ ctx, params }) => readEvaluation(ctx, params.id),
  }),
  route({
    method: 'put',
    path: '/api/evaluations/:id',
    action: 'evaluation.update',
    summary: 'Change an evaluation; the results are computed anew',
    input: { params: idParams, body: evaluationInputSchema },
    output: json(evaluationSchema),
    maxBodyBytes: MAX_EVALUATION_BYTES,
    versioned: true,
    limit: 'calculation',
    handler: ({ ctx, params, body, version }) =>
      changeEvaluation(ctx, params.id, { version, input: body }),
  }),
  route({
    method: 'post',
    path: '/api/evaluations/:id/refresh-inputs',
    action: 'evaluation.update',
    summary: 'Take over the present lines of the laser',
    input: { params: idParams },
    output: json(evaluationSchema),
    versioned: true,
    handler: ({ ctx, params, version }) => refreshInputs(ctx, params.id, version),
  }),
  route({
    method: 'post',
    path: '/api/evaluations/:id/transitions',
    action: 'evaluation.transition',
    summary: 'Take an evaluation one step further: check, return, sign, withdraw',
    input: { params: idParams, body: evaluationTransitionSchema },
    output: json(evaluationSchema),
    versioned: true,
    provesPresence: true,
    handler: ({ ctx, params, body, version }) =>
      transitionEvaluation(ctx, params.id, { version, step: body }),
  }),
  route({
    method: 'get',
    path: '/api/evaluations/:id/seal.json',
    action: 'evaluation.read',
    summary: 'The sealed canonical JSON of a signed evaluation',
    input: { params: idParams },
    output: file('application/json'),
    handler: ({ ctx, params }) => readSeal(ctx, params.id),
  }),
];
