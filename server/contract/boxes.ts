import { z } from 'zod';
import { instantSchema } from './dates.ts';
import { defineEndpoint, idParams, listOf, listQuery } from './endpoint.ts';

export const areaSchema = z.object({ id: z.uuid(), name: z.string(), boxes: z.number().int() });
export const createAreaSchema = z.object({
  name: z.string().trim().min(1, 'Enter a name for the area.').max(80),
});

export const boxRecordSchema = z.object({
  id: z.uuid(),
  householdId: z.uuid(),
  householdName: z.string(),
  areaId: z.uuid().nullable(),
  areaName: z.string().nullable(),
  /** Short code printed on the label, unique within the household, for example B-03. */
  code: z.string(),
  label: z.string(),
  version: z.number().int(),
  createdAt: instantSchema,
  counts: z.object({
    scans: z.number().int(),
    reading: z.number().int(),
    failed: z.number().int(),
    pages: z.number().int(),
    papers: z.number().int(),
    toReview: z.number().int(),
  }),
});
export type BoxRecord = z.infer<typeof boxRecordSchema>;

export const createBoxSchema = z.object({
  label: z.string().trim().max(120).default(''),
  areaId: z.uuid().nullable().default(null),
});

export const boxEndpoints = {
  listAreas: defineEndpoint({
    method: 'get',
    path: '/api/households/:id/areas',
    tag: 'boxes',
    summary: 'The areas of a household',
    access: 'box:read',
    params: idParams,
    status: 200,
    response: listOf(areaSchema),
  }),
  createArea: defineEndpoint({
    method: 'post',
    path: '/api/households/:id/areas',
    tag: 'boxes',
    summary: 'Add an area',
    access: 'box:write',
    params: idParams,
    body: createAreaSchema,
    status: 201,
    response: areaSchema,
  }),
  listBoxes: defineEndpoint({
    method: 'get',
    path: '/api/households/:id/boxes',
    tag: 'boxes',
    summary: 'The boxes of a household',
    access: 'box:read',
    params: idParams,
    query: listQuery,
    status: 200,
    response: listOf(boxRecordSchema),
  }),
  createBox: defineEndpoint({
    method: 'post',
    path: '/api/households/:id/boxes',
    tag: 'boxes',
    summary: 'Add a box',
    access: 'box:write',
    params: idParams,
    body: createBoxSchema,
    status: 201,
    response: boxRecordSchema,
  }),
  getBox: defineEndpoint({
    method: 'get',
    path: '/api/boxes/:id',
    tag: 'boxes',
    summary: 'One box',
    access: 'box:read',
    params: idParams,
    status: 200,
    response: boxRecordSchema,
  }),
  getBoxLabel: defineEndpoint({
    method: 'get',
    path: '/api/boxes/:id/label.pdf',
    tag: 'boxes',
    summary: 'Printable label with a QR code that opens the box',
    access: 'box:read',
    params: idParams,
    status: 200,
    mediaType: 'application/pdf',
  }),
  getSeparatorSheet: defineEndpoint({
    method: 'get',
    path: '/api/households/:id/separator-sheet.pdf',
    tag: 'boxes',
    summary: 'Printable sheet to lay between papers; its code splits a pile',
    access: 'box:read',
    params: idParams,
    query: z.object({
      /** Absent: what printers of the household's country hold. */
      paper: z.enum(['A4', 'Letter']).optional(),
    }),
    status: 200,
    mediaType: 'application/pdf',
  }),
};
