import { Router, type Request } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { loadCaller } from '../auth/sign-in.ts';
import { endpoints } from '../contract/endpoints.ts';
import type { Deps } from '../deps.ts';
import { SignInNeededError, TooManyError } from '../errors.ts';
import { confirmEmail, requestEmailChange } from '../use-cases/accounts/email-change.ts';
import {
  acceptInvitation,
  invite,
  listInvitations,
  openInvitation,
  updateMembership,
  withdrawInvitation,
} from '../use-cases/accounts/invitations.ts';
import { endOtherSessions } from '../use-cases/accounts/devices.ts';
import {
  changePassword,
  listDevices,
  requestPasswordReset,
  resetPassword,
} from '../use-cases/accounts/passwords.ts';
import type { Access } from './caller.ts';
import { mountForHousehold, mountForSignedIn, mountPublic } from './mount.ts';
import { describeSession, openSession } from './session-routes.ts';

const hourMs = 60 * 60 * 1000;

export function accountRoutes(deps: Deps): Router {
  const router = Router();
  const by = (access: Access) => ({
    userId: access.user.id,
    userName: access.user.name,
    practiceId: access.practiceId,
    householdId: access.householdId,
  });

  // By address of the caller alone: how often one account is written to is limited with the account.
  router.post(
    [
      endpoints.requestPasswordReset.path,
      endpoints.resetPassword.path,
      endpoints.confirmEmail.path,
      endpoints.openInvitation.path,
      endpoints.acceptInvitation.path,
    ],
    rateLimit({
      windowMs: hourMs,
      limit: 60,
      standardHeaders: 'draft-8',
      legacyHeaders: false,
      keyGenerator: (request: Request) => ipKeyGenerator(request.ip ?? ''),
      handler: () => {
        throw new TooManyError('Too many requests from this connection. Try again in an hour.');
      },
    }),
  );

  mountPublic(router, endpoints.requestPasswordReset, ({ body }) =>
    requestPasswordReset(body.email, deps),
  );
  mountPublic(router, endpoints.resetPassword, ({ body }) => resetPassword(body, deps));
  mountForSignedIn(router, endpoints.changePassword, ({ caller, body, request }) =>
    changePassword(caller.user.id, body, request.sessionID, deps),
  );
  mountForSignedIn(router, endpoints.requestEmailChange, ({ caller, body }) =>
    requestEmailChange(caller.user.id, body, deps),
  );
  mountPublic(router, endpoints.confirmEmail, ({ body }) => confirmEmail(body.token, deps));
  mountForSignedIn(router, endpoints.listDevices, ({ caller, request }) =>
    listDevices(caller.user.id, request.sessionID),
  );
  mountForSignedIn(router, endpoints.signOutOthers, ({ caller, request }) =>
    endOtherSessions(caller.user.id, request.sessionID),
  );

  mountForHousehold(router, endpoints.listInvitations, ({ access }) =>
    listInvitations(access.householdId, deps),
  );
  mountForHousehold(router, endpoints.invite, ({ access, body }) => invite(body, by(access), deps));
  mountForHousehold(router, endpoints.withdrawInvitation, ({ access, params }) =>
    withdrawInvitation(params.invitation, by(access), deps),
  );
  mountForHousehold(router, endpoints.updateMembership, ({ access, params, body }) =>
    updateMembership(params.membership, body, by(access), deps),
  );
  mountPublic(router, endpoints.openInvitation, ({ body }) => openInvitation(body.token, deps));
  mountPublic(router, endpoints.acceptInvitation, async ({ body, request }) => {
    const caller = await loadCaller(await acceptInvitation(body, deps), deps.clock);
    if (!caller) throw new SignInNeededError();
    await openSession(request, caller);
    return describeSession(request);
  });
  return router;
}
