import { file, idParams, route } from '../../http/route';
import { readSettings } from '../settings/settings-service';
import { evaluationReport } from './evaluation-report';
import { readEvaluation } from './evaluation-service';

export const EVALUATION_REPORT_ROUTES = [
  route({
    method: 'get',
    path: '/api/evaluations/:id/report.pdf',
    action: 'evaluation.read',
    summary: 'The evaluation as a printed report',
    input: { params: idParams },
    output: file('application/pdf'),
    limit: 'export',
    handler: async ({ ctx, params }) => {
      const evaluation = await readEvaluation(ctx, params.id);
      const site = await readSettings(ctx);
      const printedAt = ctx.now.toISOString();
      return {
        fileName: `${evaluation.laser.tag}-evaluation-${evaluation.number}.pdf`,
        mediaType: 'application/pdf',
        body: await evaluationReport({ evaluation, site, printedAt }),
      };
    },
  }),
];
