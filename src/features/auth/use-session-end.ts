import { useCallback, useEffect, useRef, useState } from "react";
import type { Session } from "../../../shared/contracts/auth.ts";
import { onSignInNeeded } from "../../lib/api-client.ts";

/**
 * Notices that the session ended while a page was open: a request was answered "sign-in needed"
 * though somebody was signed in. Gives the session that ended until `clear` is called. The page
 * stays as it is, so nothing typed is lost.
 */
export function useSessionEnd(session: Session | null): { endedSession: Session | null; clear: () => void } {
  const [endedSession, setEndedSession] = useState<Session | null>(null);
  const last = useRef<Session | null>(null);

  useEffect(() => {
    if (session !== null) last.current = session;
  }, [session]);

  useEffect(() => onSignInNeeded(() => setEndedSession((ended) => ended ?? last.current)), []);

  const clear = useCallback(() => {
    last.current = null;
    setEndedSession(null);
  }, []);
  return { endedSession, clear };
}
