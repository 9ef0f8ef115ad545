import * as createPeople from './2026-12-01-1200-create-people';
import * as createSessions from './2026-12-01-1201-create-sessions';
import * as createAuditTrail from './2026-12-01-1202-create-audit-trail';
import * as createAreas from './2026-12-01-1203-create-areas';
import * as createSettings from './2026-12-01-1204-create-settings';
import * as createJobLeases from './2026-12-01-1205-create-job-leases';
import * as createLasers from './2026-12-01-1300-create-lasers';
import * as createEvaluations from './2026-12-01-1301-create-evaluations';
import * as createLaserImports from './2026-12-01-1302-create-laser-imports';

/** Every step of the schema; applied in the order of the names, never edited once released. */
export const MIGRATIONS = {
  '2026-12-01-1200-create-people': createPeople,
  '2026-12-01-1201-create-sessions': createSessions,
  '2026-12-01-1202-create-audit-trail': createAuditTrail,
  '2026-12-01-1203-create-areas': createAreas,
  '2026-12-01-1204-create-settings': createSettings,
  '2026-12-01-1205-create-job-leases': createJobLeases,
  '2026-12-01-1300-create-lasers': createLasers,
  '2026-12-01-1301-create-evaluations': createEvaluations,
  '2026-12-01-1302-create-laser-imports': createLaserImports,
} as const;
