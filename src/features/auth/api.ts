import { queryOptions, useMutation, useQueryClient } from "@tanstack/react-query";
import type { EndpointCall } from "../../../shared/contract.ts";
import { authContract, type Session } from "../../../shared/contracts/auth.ts";
import { callApi } from "../../lib/api-client.ts";
import { askOrRecall, clearShelf } from "../../lib/offline-shelf.ts";

/** Who is signed in; null when nobody is. */
export const sessionQuery = queryOptions({
  queryKey: ["auth", "session"],
  queryFn: async ({ signal }) => {
    const { session, keptAt } = await askOrRecall("session", () => callApi(authContract.session, {}, signal));
    if (keptAt === undefined && session === null) await clearShelf();
    // Without the server the person before is believed to be here, for as long as the session would have lasted.
    return keptAt !== undefined && session !== null && session.endsAt < Date.now() ? null : session;
  },
  // Every page waits for it: a server that is down is said at once, not after three tries.
  retry: false,
});

/** Three passphrases to choose from; dealt anew each time it is asked for. */
export const passphrasesQuery = queryOptions({
  queryKey: ["auth", "passphrases"],
  queryFn: async ({ signal }) => (await callApi(authContract.suggestPassphrases, {}, signal)).passphrases,
  staleTime: Infinity,
});

/**
 * Everything that was read belongs to the person before: it is dropped, and the session put in its
 * place, so that a second pupil at the same computer sees nothing of the first.
 */
function useEnter() {
  const client = useQueryClient();
  return (session: Session) => {
    const before = client.getQueryData(sessionQuery.queryKey);
    if (before?.user.id !== session.user.id) {
      client.clear();
      void clearShelf();
    }
    client.setQueryData(sessionQuery.queryKey, session);
  };
}

export function useStudentSignIn() {
  const enter = useEnter();
  return useMutation({
    mutationFn: (body: EndpointCall<typeof authContract.studentSignIn>["body"]) =>
      callApi(authContract.studentSignIn, { body }),
    onSuccess: enter,
  });
}

export function useStaffSignIn() {
  const enter = useEnter();
  return useMutation({
    mutationFn: (body: EndpointCall<typeof authContract.staffSignIn>["body"]) =>
      callApi(authContract.staffSignIn, { body }),
    onSuccess: enter,
  });
}

export function useRedeemReset() {
  const enter = useEnter();
  return useMutation({
    mutationFn: (body: EndpointCall<typeof authContract.redeemReset>["body"]) =>
      callApi(authContract.redeemReset, { body }),
    onSuccess: enter,
  });
}

/** Ends this session, or all of the person's; what was read is dropped either way. */
export function useSignOut() {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ everywhere }: { everywhere: boolean }) =>
      callApi(everywhere ? authContract.signOutEverywhere : authContract.signOut, {}),
    onSuccess: async () => {
      await clearShelf();
      client.clear();
      client.setQueryData(sessionQuery.queryKey, null);
    },
  });
}

export function useChangePassword() {
  return useMutation({
    mutationFn: (body: EndpointCall<typeof authContract.changePassword>["body"]) =>
      callApi(authContract.changePassword, { body }),
  });
}
