import type { RequestHandler } from "express";
import { authContract } from "../../shared/contracts/auth.ts";
import type { Sessions } from "../identity/sessions.ts";

/**
 * Puts the signed-in person on the request. Roles and the disabled flag are read anew each time, so a
 * change counts with the next request. Asking for the session itself does not keep it alive: a page
 * that lies open and asks now and then must still end.
 */
export function sessionOf(sessions: Sessions): RequestHandler {
  return async (req, _res, next) => {
    const found = await sessions.find(req.headers.cookie);
    if (found !== null)
      req.person = req.baseUrl + req.path === authContract.session.path ? found : sessions.touch(found);
    next();
  };
}
