import { evaluate } from '@shared/hazard/evaluate';
import * as z from 'zod';

import { InvalidInput } from '../../http/errors';
import { json, route } from '../../http/route';

/** A case as engine contract 2 has it; the engine itself checks every field. */
const caseSchema = z.record(z.string(), z.unknown()).meta({
  description: 'One hazard case: ruleSet, beams, exposure, path, aid, air, model, at.',
});
const resultSchema = z.looseObject({
  ruleSet: z.string(),
  edition: z.string(),
  engineVersion: z.string(),
});
const querySchema = z.strictObject({
  /** 1: without steps and candidates. */
  bare: z.enum(['0', '1', '']).optional(),
});

export const EVALUATE_ROUTES = [
  route({
    method: 'post',
    path: '/api/evaluate',
    action: 'case.evaluate',
    summary: 'Evaluate one hazard case; nothing is stored',
    input: { query: querySchema, body: caseSchema },
    output: json(resultSchema),
    transaction: 'read',
    limit: 'calculation',
    handler: ({ query, body }) => {
      const bare = query.bare !== undefined && query.bare !== '0';
      const result = evaluate(body, { bare });
      if ('errors' in result) throw new InvalidInput(result.errors);
      return { ...result };
    },
  }),
];
