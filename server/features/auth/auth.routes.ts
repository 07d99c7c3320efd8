import type { Request, Response } from "express";
import type { authContract } from "../../../shared/contracts/auth.ts";
import type { UserId } from "../../../shared/ids.ts";
import type { Handlers } from "../../http/mount.ts";
import { appendAudit } from "../../identity/audit-log.ts";
import { dealPassphrase } from "../../identity/passphrases.ts";
import { endSessionsOf } from "../../identity/sessions.ts";
import {
  type AuthDeps,
  changePassword,
  checkStaffSignIn,
  checkStudentSignIn,
  presentSession,
  redeemReset,
} from "./auth.service.ts";

/** The handlers of the auth contract. */
export function createAuthHandlers(deps: AuthDeps): Handlers<typeof authContract> {
  const { db, clock, sessions } = deps;
  const start = (req: Request, res: Response, userId: UserId) => startSession(deps, req, res, userId);

  return {
    studentSignIn: async ({ body, req, res }) => start(req, res, await checkStudentSignIn(deps, body, addressOf(req))),
    staffSignIn: async ({ body, req, res }) => start(req, res, await checkStaffSignIn(deps, body, addressOf(req))),
    redeemReset: async ({ body, req, res }) => start(req, res, await redeemReset(deps, body, addressOf(req))),
    session: ({ req }) => ({ session: req.person ? presentSession(db, req.person) : null }),
    signOut: ({ req, res }) => {
      if (req.person) {
        sessions.end(req.person.sessionId);
        appendAudit(db, { at: clock.now(), actorId: req.person.userId, event: "signed-out" });
      }
      res.append("Set-Cookie", sessions.blankCookie);
    },
    signOutEverywhere: ({ actor, res }) => {
      endSessionsOf(db, actor.userId);
      appendAudit(db, { at: clock.now(), actorId: actor.userId, event: "signed-out-everywhere" });
      res.append("Set-Cookie", sessions.blankCookie);
    },
    changePassword: ({ actor, body, req }) =>
      changePassword(deps, actor, { ...body, sessionId: req.person?.sessionId ?? "" }, addressOf(req)),
    suggestPassphrases: () => ({ passphrases: [dealPassphrase(), dealPassphrase(), dealPassphrase()] }),
  };
}

/** Opens a new session and drops the one that the browser came with: a token from before is worth nothing after. */
async function startSession({ db, clock, sessions }: AuthDeps, req: Request, res: Response, userId: UserId) {
  const { session, cookie } = await sessions.open(userId);
  if (req.person) sessions.end(req.person.sessionId);
  appendAudit(db, { at: clock.now(), actorId: userId, event: "signed-in" });
  res.append("Set-Cookie", cookie);
  return presentSession(db, session);
}

function addressOf(req: Request): string {
  return req.ip ?? "unknown";
}
