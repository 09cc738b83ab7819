import { z } from 'zod';
import { defineEndpoint } from './endpoint.ts';
import { membershipSchema } from './permissions.ts';

export const userSchema = z.object({ id: z.uuid(), email: z.string(), name: z.string() });
export type User = z.infer<typeof userSchema>;

export const signInSchema = z.object({
  email: z.string().min(1, 'Enter your e-mail address.').max(254),
  password: z.string().min(1, 'Enter your password.').max(200),
});

export const sessionSchema = z.object({
  user: userSchema.nullable(),
  memberships: z.array(membershipSchema),
  /** Sent back as X-CSRF-Token with every state-changing call; changes at sign-in. */
  csrfToken: z.string(),
});
export type Session = z.infer<typeof sessionSchema>;

export const sessionEndpoints = {
  getSession: defineEndpoint({
    method: 'get',
    path: '/api/session',
    tag: 'session',
    summary: 'Who am I, and the CSRF token to send with changes',
    access: 'public',
    status: 200,
    response: sessionSchema,
  }),
  signIn: defineEndpoint({
    method: 'post',
    path: '/api/session',
    tag: 'session',
    summary: 'Sign in with e-mail and password',
    access: 'public',
    body: signInSchema,
    status: 200,
    response: sessionSchema,
  }),
  signOut: defineEndpoint({
    method: 'delete',
    path: '/api/session',
    tag: 'session',
    summary: 'Sign out',
    access: 'public',
    status: 204,
  }),
};
