import { z } from 'zod';
import { instantSchema, isoDateSchema } from './dates.ts';
import { classIdSchema } from './document-classes.ts';
import { defineEndpoint, idParams, listOf, listQuery } from './endpoint.ts';

export const reminderKinds = ['expiry', 'keep-until'] as const;
/** `coming` is foreseen and not yet due; the others are on record. */
export const reminderStates = ['coming', 'queued', 'sent', 'failing'] as const;
export const reminderSchema = z.object({
  /** Stable: kind, paper and date. */
  key: z.string(),
  kind: z.enum(reminderKinds),
  state: z.enum(reminderStates),
  /** Day on which the message goes out. */
  on: isoDateSchema,
  /** The date that it is about. */
  about: isoDateSchema,
  paperId: z.uuid().nullable(),
  paperNumber: z.number().int().nullable(),
  class: classIdSchema.nullable(),
  personName: z.string().nullable(),
  sentAt: instantSchema.nullable(),
  lastError: z.string().nullable(),
});
export type Reminder = z.infer<typeof reminderSchema>;

export const mailSchema = z.object({
  id: z.uuid(),
  toName: z.string(),
  subject: z.string(),
  state: z.enum(['queued', 'sent', 'failing']),
  attempts: z.number().int(),
  createdAt: instantSchema,
  sentAt: instantSchema.nullable(),
  nextAttemptAt: instantSchema.nullable(),
  lastError: z.string().nullable(),
});

export const reminderEndpoints = {
  listReminders: defineEndpoint({
    method: 'get',
    path: '/api/households/:id/reminders',
    tag: 'reminders',
    summary: 'What is coming and what was sent',
    access: 'reminder:read',
    params: idParams,
    status: 200,
    response: listOf(reminderSchema),
  }),
  listMail: defineEndpoint({
    method: 'get',
    path: '/api/mail',
    tag: 'reminders',
    summary: 'Messages of the practice: sent, waiting and failing',
    access: 'mail:read',
    query: listQuery,
    status: 200,
    response: listOf(mailSchema),
  }),
};

export const calendarEndpoints = {
  getCalendarAddress: defineEndpoint({
    method: 'post',
    path: '/api/households/:id/calendar-address',
    tag: 'calendar',
    summary: "Make one's own secret address of the calendar feed; an earlier one stops working",
    access: 'calendar:read',
    params: idParams,
    status: 201,
    response: z.object({ url: z.string() }),
  }),
  endCalendarAddress: defineEndpoint({
    method: 'delete',
    path: '/api/households/:id/calendar-address',
    tag: 'calendar',
    summary: "End one's own address of the calendar feed",
    access: 'calendar:read',
    params: idParams,
    status: 204,
  }),
  getPaperCalendar: defineEndpoint({
    method: 'get',
    path: '/api/papers/:id/calendar.ics',
    tag: 'calendar',
    summary: 'The dates of one paper as a calendar file (RFC 5545)',
    access: 'paper:read',
    params: idParams,
    status: 200,
    mediaType: 'text/calendar',
  }),
  getCalendar: defineEndpoint({
    method: 'get',
    path: '/api/households/:id/calendar.ics',
    tag: 'calendar',
    summary: 'Calendar feed (RFC 5545); the token in the address is the key',
    access: 'public',
    params: idParams,
    query: z.object({ token: z.string().max(200).default('') }),
    status: 200,
    mediaType: 'text/calendar',
  }),
};
