import {
  type Area,
  areaInputSchema,
  areaListQuerySchema,
  areaPageSchema,
  areaSchema,
} from '@shared/model/areas';

import { type CsvColumn, csvDownload } from '../../http/csv';
import { file, idParams, json, route } from '../../http/route';
import { changeArea, createArea, eachArea, readArea, readAreas } from './areas-service';

const COLUMNS: readonly CsvColumn<Area>[] = [
  { header: 'code', cell: (area) => area.code },
  { header: 'name', cell: (area) => area.name },
  { header: 'building', cell: (area) => area.building },
  { header: 'room', cell: (area) => area.room },
  { header: 'department', cell: (area) => area.department },
  { header: 'supervisor', cell: (area) => area.supervisor?.name },
  { header: 'alternate', cell: (area) => area.alternate?.name },
  { header: 'wallDistanceM', cell: (area) => area.wallDistanceM },
  { header: 'phone', cell: (area) => area.phone },
  { header: 'laserCount', cell: (area) => area.laserCount },
  { header: 'highestClass', cell: (area) => area.highestClass },
  { header: 'note', cell: (area) => area.note },
];

export const AREAS_ROUTES = [
  route({
    method: 'get',
    path: '/api/areas',
    action: 'area.read',
    summary: 'Areas by code',
    input: { query: areaListQuerySchema },
    output: json(areaPageSchema),
    handler: ({ ctx, query }) => readAreas(ctx, query),
  }),
  route({
    method: 'get',
    path: '/api/areas.csv',
    action: 'area.read',
    summary: 'The same list as CSV',
    input: { query: areaListQuerySchema },
    output: file('text/csv'),
    limit: 'export',
    handler: ({ ctx, query }) => csvDownload('areas.csv', COLUMNS, eachArea(ctx, query)),
  }),
  route({
    method: 'post',
    path: '/api/areas',
    action: 'area.create',
    summary: 'Record an area',
    input: { body: areaInputSchema },
    output: json(areaSchema),
    status: 201,
    location: ({ id }) => `/api/areas/${id}`,
    handler: ({ ctx, body }) => createArea(ctx, body),
  }),
  route({
    method: 'get',
    path: '/api/areas/:id',
    action: 'area.read',
    summary: 'One area',
    input: { params: idParams },
    output: json(areaSchema),
    handler: ({ ctx, params }) => readArea(ctx, params.id),
  }),
  route({
    method: 'put',
    path: '/api/areas/:id',
    action: 'area.update',
    summary: 'Change an area',
    input: { params: idParams, body: areaInputSchema },
    output: json(areaSchema),
    versioned: true,
    handler: ({ ctx, params, body, version }) =>
      changeArea(ctx, params.id, { version, input: body }),
  }),
];
