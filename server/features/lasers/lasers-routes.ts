import { laserFileInputSchema, laserFileSchema, MAX_FILE_BYTES } from '@shared/model/files';
import { idSchema, pageQuery } from '@shared/model/common';
import {
  duplicateQuerySchema,
  duplicatesSchema,
  laserFilterSchema,
  laserInputSchema,
  laserListQuerySchema,
  laserPageSchema,
  laserSchema,
  laserTransitionSchema,
} from '@shared/model/lasers';
import { auditTrailPageSchema } from '@shared/model/records';
import * as z from 'zod';

import { csvDownload } from '../../http/csv';
import { file, idParams, json, NOTHING, route } from '../../http/route';
import { historyOf } from '../records/records-service';
import { csvRows, LASER_COLUMNS } from './laser-csv';
import { attachFile, readFile, removeFile } from './laser-file-service';
import {
  changeLaser,
  eachLaserInReach,
  enterLaser,
  readDuplicates,
  readLaser,
  readLasers,
  requireReadable,
  transitionLaser,
} from './laser-service';

/** 64 lines with every field and what was typed. */
const MAX_LASER_BYTES = 500_000;
const fileParams = z.strictObject({ id: idSchema, fileId: idSchema });

export const LASERS_ROUTES = [
  route({
    method: 'get',
    path: '/api/lasers',
    action: 'laser.read',
    summary: 'The register, page by page',
    input: { query: laserListQuerySchema },
    output: json(laserPageSchema),
    handler: ({ ctx, query }) => readLasers(ctx, query),
  }),
  route({
    method: 'get',
    path: '/api/lasers.csv',
    action: 'laser.read',
    summary: 'The same lasers as CSV, one row a line',
    input: { query: laserFilterSchema },
    output: file('text/csv'),
    limit: 'export',
    handler: ({ ctx, query }) =>
      csvDownload('lasers.csv', LASER_COLUMNS, csvRows(eachLaserInReach(ctx, query))),
  }),
  route({
    method: 'get',
    path: '/api/lasers/duplicates',
    action: 'laser.read',
    summary: 'Lasers with the same serial',
    input: { query: duplicateQuerySchema },
    output: json(duplicatesSchema),
    handler: ({ ctx, query }) => readDuplicates(ctx, query),
  }),
  route({
    method: 'post',
    path: '/api/lasers',
    action: 'laser.register',
    summary: 'Register a laser that is here',
    input: { body: laserInputSchema },
    output: json(laserSchema),
    maxBodyBytes: MAX_LASER_BYTES,
    status: 201,
    location: ({ id }) => `/api/lasers/${id}`,
    handler: ({ ctx, body }) => enterLaser(ctx, body, 'register'),
  }),
  route({
    method: 'post',
    path: '/api/lasers/found',
    action: 'laser.declare-found',
    summary: 'Declare a laser found, given, brought or home-built',
    input: { body: laserInputSchema },
    output: json(laserSchema),
    maxBodyBytes: MAX_LASER_BYTES,
    status: 201,
    location: ({ id }) => `/api/lasers/${id}`,
    handler: ({ ctx, body }) => enterLaser(ctx, body, 'declare-found'),
  }),
  route({
    method: 'get',
    path: '/api/lasers/:id',
    action: 'laser.read',
    summary: 'One laser',
    input: { params: idParams },
    output: json(laserSchema),
    handler: ({ ctx, params }) => readLaser(ctx, params.id),
  }),
  route({
    method: 'put',
    path: '/api/lasers/:id',
    action: 'laser.update',
    summary: 'Change a laser; its signed evaluation becomes stale when its inputs change',
    input: { params: idParams, body: laserInputSchema },
    output: json(laserSchema),
    maxBodyBytes: MAX_LASER_BYTES,
    versioned: true,
    handler: ({ ctx, params, body, version }) =>
      changeLaser(ctx, params.id, { version, input: body }),
  }),
  route({
    method: 'post',
    path: '/api/lasers/:id/transitions',
    action: 'laser.transition',
    summary: 'Take a laser one step further in its life cycle',
    input: { params: idParams, body: laserTransitionSchema },
    output: json(laserSchema),
    versioned: true,
    handler: ({ ctx, params, body, version }) =>
      transitionLaser(ctx, params.id, { version, step: body }),
  }),
  route({
    method: 'get',
    path: '/api/lasers/:id/history',
    action: 'laser.read',
    summary: 'What happened to a laser, newest first',
    input: { params: idParams, query: z.strictObject(pageQuery) },
    output: json(auditTrailPageSchema),
    handler: async ({ ctx, params, query }) => {
      const { id } = await requireReadable(ctx, params.id);
      return historyOf(ctx, { kind: 'laser', id }, query);
    },
  }),
  route({
    method: 'post',
    path: '/api/lasers/:id/files',
    action: 'laser.attach-file',
    summary: 'Attach a data sheet, a photo or another document',
    input: { params: idParams, body: laserFileInputSchema },
    output: json(laserFileSchema),
    multipart: { maxBytes: MAX_FILE_BYTES, kinds: ['pdf', 'png', 'jpeg', 'webp'] },
    limit: 'upload',
    status: 201,
    handler: ({ ctx, params, body, upload }) => attachFile(ctx, params.id, { upload, input: body }),
  }),
  route({
    method: 'get',
    path: '/api/lasers/:id/files/:fileId',
    action: 'laser.read',
    summary: 'The content of a file',
    input: { params: fileParams },
    output: file('application/octet-stream'),
    handler: ({ ctx, params }) => readFile(ctx, params.id, params.fileId),
  }),
  route({
    method: 'delete',
    path: '/api/lasers/:id/files/:fileId',
    action: 'laser.attach-file',
    summary: 'Take a file away; its record stays',
    input: { params: fileParams },
    output: NOTHING,
    handler: ({ ctx, params }) => removeFile(ctx, params.id, params.fileId),
  }),
];
