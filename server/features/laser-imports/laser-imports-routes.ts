import { laserImportSchema } from '@shared/model/laser-imports';

import { file, idParams, json, NOTHING, route } from '../../http/route';
import { importTemplate } from './import-template';
import { beginImport, cancelImport, readImport, saveImport } from './laser-import-service';

const MAX_CSV_BYTES = 5 * 1024 * 1024;

export const LASER_IMPORTS_ROUTES = [
  route({
    method: 'get',
    path: '/api/laser-imports/template.csv',
    action: 'laser.import',
    summary: 'A file to fill in: header with units, two example rows',
    output: file('text/csv'),
    handler: () => ({
      fileName: 'lasers-template.csv',
      mediaType: 'text/csv; charset=utf-8',
      body: importTemplate(),
    }),
  }),
  route({
    method: 'post',
    path: '/api/laser-imports',
    action: 'laser.import',
    summary: 'Check a file of lasers; nothing is stored until it is saved',
    output: json(laserImportSchema),
    multipart: { maxBytes: MAX_CSV_BYTES, kinds: ['csv'] },
    transaction: 'own',
    limit: 'upload',
    status: 202,
    location: ({ id }) => `/api/laser-imports/${id}`,
    handler: ({ ctx, upload }) => beginImport(ctx, upload),
  }),
  route({
    method: 'get',
    path: '/api/laser-imports/:id',
    action: 'laser.import',
    summary: 'How far the check or the saving of a file has come',
    input: { params: idParams },
    output: json(laserImportSchema),
    handler: ({ ctx, params }) => readImport(ctx, params.id),
  }),
  route({
    method: 'post',
    path: '/api/laser-imports/:id/save',
    action: 'laser.import',
    summary: 'Save every laser of a checked file, or none',
    input: { params: idParams },
    output: json(laserImportSchema),
    transaction: 'own',
    status: 202,
    handler: ({ ctx, params }) => saveImport(ctx, params.id),
  }),
  route({
    method: 'delete',
    path: '/api/laser-imports/:id',
    action: 'laser.import',
    summary: 'Cancel an import; nothing of it is kept',
    input: { params: idParams },
    output: NOTHING,
    transaction: 'own',
    handler: ({ ctx, params }) => cancelImport(ctx, params.id),
  }),
];
