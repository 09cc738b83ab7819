/** Accounts: passwords, addresses, signed-in devices, invitations and memberships. */
import { z } from 'zod';
import { instantSchema, isoDateSchema } from './dates.ts';
import { defineEndpoint, idParams, listOf } from './endpoint.ts';
import { memberSchema } from './households.ts';
import { reachSchema, rightsSchema, standingSchema } from './permissions.ts';
import { sessionSchema } from './sessions.ts';

export const shortestPassword = 10;
export const passwordSchema = z
  .string()
  .min(shortestPassword, `Choose a password of at least ${shortestPassword} characters.`)
  .max(200, 'Choose a password of at most 200 characters.');
export const emailSchema = z
  .email('Enter an e-mail address, for example name@example.org.')
  .max(254);
const tokenSchema = z.string().min(1, 'The link is not complete. Copy all of it.').max(200);

/** What an invitation, and later the membership, allows. Owners are not invited to a household. */
export const membershipTermsSchema = z.object({
  role: z.enum(['assistant', 'client', 'adviser']),
  /** Clients: what they are to the household. */
  standing: standingSchema.nullable().default(null),
  rights: rightsSchema.nullable().default(null),
  /** Advisers: the class groups shared with them. */
  sharedGroups: reachSchema.nullable().default(null),
  startsOn: isoDateSchema.nullable().default(null),
  endsOn: isoDateSchema.nullable().default(null),
  /** Which evidence of the standing was seen: what, when, by whom. */
  evidence: z.string().trim().max(500).nullable().default(null),
});
export type MembershipTerms = z.infer<typeof membershipTermsSchema>;

export const inviteSchema = membershipTermsSchema.extend({
  email: emailSchema,
  name: z.string().trim().min(1, 'Enter a name.').max(120),
});

export const invitationSchema = z.object({
  id: z.uuid(),
  email: z.string(),
  name: z.string(),
  terms: membershipTermsSchema,
  createdAt: instantSchema,
  expiresAt: instantSchema,
  isExpired: z.boolean(),
});
export type Invitation = z.infer<typeof invitationSchema>;

export const openInvitationSchema = z.object({
  email: z.string(),
  name: z.string(),
  practiceName: z.string(),
  householdName: z.string(),
  role: z.enum(['assistant', 'client', 'adviser']),
  /** The address has an account: its password is asked for instead of a new one. */
  hasAccount: z.boolean(),
});

export const updateMembershipSchema = z
  .strictObject({
    standing: standingSchema.nullable(),
    rights: rightsSchema.nullable(),
    sharedGroups: reachSchema.nullable(),
    startsOn: isoDateSchema,
    endsOn: isoDateSchema.nullable(),
    evidence: z.string().trim().max(500).nullable(),
  })
  .partial();

export const deviceSchema = z.object({
  id: z.string(),
  /** Browser and system in words, as far as the browser says them. */
  description: z.string(),
  signedInAt: instantSchema.nullable(),
  isThis: z.boolean(),
});
export type Device = z.infer<typeof deviceSchema>;

export const accountEndpoints = {
  requestPasswordReset: defineEndpoint({
    method: 'post',
    path: '/api/password-reset-requests',
    tag: 'accounts',
    summary:
      'Ask for a link to set a new password; says the same whether the address is known or not',
    access: 'public',
    body: z.object({ email: emailSchema }),
    status: 202,
  }),
  resetPassword: defineEndpoint({
    method: 'post',
    path: '/api/password-resets',
    tag: 'accounts',
    summary: 'Set a new password with the link from the message; all devices are signed out',
    access: 'public',
    body: z.object({ token: tokenSchema, password: passwordSchema }),
    status: 204,
  }),
  changePassword: defineEndpoint({
    method: 'post',
    path: '/api/account/password',
    tag: 'accounts',
    summary: 'Change the password; all other devices are signed out',
    access: 'signed-in',
    body: z.object({
      current: z.string().min(1, 'Enter your present password.').max(200),
      next: passwordSchema,
    }),
    status: 204,
  }),
  requestEmailChange: defineEndpoint({
    method: 'post',
    path: '/api/account/email',
    tag: 'accounts',
    summary: 'Change the e-mail address; both addresses get a link and both must confirm',
    access: 'signed-in',
    body: z.object({
      email: emailSchema,
      password: z.string().min(1, 'Enter your password.').max(200),
    }),
    status: 202,
  }),
  confirmEmail: defineEndpoint({
    method: 'post',
    path: '/api/email-confirmations',
    tag: 'accounts',
    summary: 'Confirm a change of e-mail address from one of its two addresses',
    access: 'public',
    body: z.object({ token: tokenSchema }),
    status: 200,
    response: z.object({
      /** False while the other address has not confirmed yet. */
      isChanged: z.boolean(),
    }),
  }),
  listDevices: defineEndpoint({
    method: 'get',
    path: '/api/account/devices',
    tag: 'accounts',
    summary: 'Where one is signed in',
    access: 'signed-in',
    status: 200,
    response: listOf(deviceSchema),
  }),
  signOutOthers: defineEndpoint({
    method: 'delete',
    path: '/api/account/devices',
    tag: 'accounts',
    summary: 'Sign out everywhere but here',
    access: 'signed-in',
    status: 204,
  }),
  listInvitations: defineEndpoint({
    method: 'get',
    path: '/api/households/:id/invitations',
    tag: 'accounts',
    summary: 'Invitations that were not taken up yet',
    access: 'members:manage',
    params: idParams,
    status: 200,
    response: listOf(invitationSchema),
  }),
  invite: defineEndpoint({
    method: 'post',
    path: '/api/households/:id/invitations',
    tag: 'accounts',
    summary: 'Invite somebody to a household by e-mail',
    access: 'members:manage',
    params: idParams,
    body: inviteSchema,
    status: 201,
    response: invitationSchema,
  }),
  withdrawInvitation: defineEndpoint({
    method: 'delete',
    path: '/api/households/:id/invitations/:invitation',
    tag: 'accounts',
    summary: 'Withdraw an invitation',
    access: 'members:manage',
    params: z.object({ id: z.uuid(), invitation: z.uuid() }),
    status: 204,
  }),
  openInvitation: defineEndpoint({
    method: 'post',
    path: '/api/invitation-openings',
    tag: 'accounts',
    summary: 'What an invitation link leads to',
    access: 'public',
    body: z.object({ token: tokenSchema }),
    status: 200,
    response: openInvitationSchema,
  }),
  acceptInvitation: defineEndpoint({
    method: 'post',
    path: '/api/invitation-acceptances',
    tag: 'accounts',
    summary: 'Take an invitation up, with a new password or that of the account that is there',
    access: 'public',
    body: z.object({
      token: tokenSchema,
      name: z.string().trim().min(1, 'Enter your name.').max(120),
      password: passwordSchema,
    }),
    status: 200,
    response: sessionSchema,
  }),
  updateMembership: defineEndpoint({
    method: 'patch',
    path: '/api/households/:id/members/:membership',
    tag: 'accounts',
    summary: "Change a membership's rights, standing or days; an end on a past day ends it now",
    access: 'members:manage',
    params: z.object({ id: z.uuid(), membership: z.uuid() }),
    body: updateMembershipSchema,
    status: 200,
    response: memberSchema,
  }),
};
