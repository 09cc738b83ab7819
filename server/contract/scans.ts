import { z } from 'zod';
import { instantSchema } from './dates.ts';
import { defineEndpoint, idParams } from './endpoint.ts';

export const scanStatuses = ['waiting', 'reading', 'read', 'failed'] as const;
export const scanSchema = z.object({
  id: z.uuid(),
  boxId: z.uuid(),
  /** The uploader's file name: a label only. */
  name: z.string(),
  mediaType: z.string(),
  bytes: z.number().int(),
  status: z.enum(scanStatuses),
  /** Why reading failed, a sentence that says what to do next. */
  reason: z.string().nullable(),
  /** Null until the file was opened. */
  pages: z.number().int().nullable(),
  pagesRead: z.number().int(),
  blankPages: z.number().int(),
  papers: z.number().int(),
  createdAt: instantSchema,
});
export type Scan = z.infer<typeof scanSchema>;

export const uploadResultSchema = z.object({
  name: z.string(),
  accepted: z.boolean(),
  /** A file that this household already has: `scan` is the one that is there. */
  alreadyHere: z.boolean(),
  /** Why the file was refused. */
  reason: z.string().nullable(),
  scan: scanSchema.nullable(),
});
export type UploadResult = z.infer<typeof uploadResultSchema>;

export const scanEndpoints = {
  uploadScans: defineEndpoint({
    method: 'post',
    path: '/api/boxes/:id/scans',
    tag: 'scans',
    summary: 'Upload files (multipart, field "files", many)',
    access: 'scan:upload',
    params: idParams,
    multipart: true,
    status: 202,
    response: z.object({ items: z.array(uploadResultSchema) }),
  }),
  listScans: defineEndpoint({
    method: 'get',
    path: '/api/boxes/:id/scans',
    tag: 'scans',
    summary: 'The scans of a box and how far reading got',
    access: 'scan:read',
    params: idParams,
    status: 200,
    response: z.object({ items: z.array(scanSchema) }),
  }),
  retryScan: defineEndpoint({
    method: 'post',
    path: '/api/scans/:id/retry',
    tag: 'scans',
    summary: 'Read a failed scan again',
    access: 'scan:upload',
    params: idParams,
    status: 202,
    response: scanSchema,
  }),
  getPageImage: defineEndpoint({
    method: 'get',
    path: '/api/pages/:id/image',
    tag: 'scans',
    summary: 'The upright picture of a page',
    access: 'paper:read',
    params: idParams,
    status: 200,
    mediaType: 'image/jpeg',
  }),
  getPageThumbnail: defineEndpoint({
    method: 'get',
    path: '/api/pages/:id/thumbnail',
    tag: 'scans',
    summary: 'A small picture of a page',
    access: 'paper:read',
    params: idParams,
    status: 200,
    mediaType: 'image/jpeg',
  }),
};
