import { useQuery } from "@tanstack/react-query";
import { lazy, Suspense } from "react";
import { Outlet, useMatches, useNavigate } from "react-router";
import type { Session } from "../../shared/contracts/auth.ts";
import { AppShell } from "../components/app-shell.tsx";
import type { BandAccountLink } from "../components/band-account.tsx";
import type { BandProps } from "../components/band.tsx";
import { sessionQuery, useSignOut } from "../features/auth/api.ts";
import { homeOf } from "../features/auth/model/home-of.ts";
import { useSessionEnd } from "../features/auth/use-session-end.ts";
import { queryClient } from "../lib/query-client.ts";
import { bandItems } from "./navigation.ts";
import { useBandCounts } from "./use-band-counts.ts";

/** Seldom needed, and its forms weigh as much as a page. */
const SignInAgain = lazy(() =>
  import("../features/auth/components/sign-in-again.tsx").then((module) => ({ default: module.SignInAgain })),
);

/** What a route may say of itself in `handle`. */
export interface RouteHandle {
  /** The page brings its own head: sign-in, studio. */
  readonly hasOwnHead?: boolean;
}

/** Reads the session before the first page. A server that is down must not hide public pages, so a failure passes. */
export async function loader() {
  await queryClient.prefetchQuery(sessionQuery);
  return null;
}

/** The shell round every page: the band of the person's roles, and the dialog when a session ends under an open page. */
export function Root() {
  const { data: session = null } = useQuery(sessionQuery);
  const end = useSessionEnd(session);
  const band = useBand(end.endedSession ?? session, end.clear);
  const hasOwnHead = useMatches().some((match) => (match.handle as RouteHandle | undefined)?.hasOwnHead === true);
  return (
    <AppShell {...(!hasOwnHead && { band })}>
      <Outlet />
      <Suspense>{end.endedSession && <SignInAgain session={end.endedSession} onDone={end.clear} />}</Suspense>
    </AppShell>
  );
}

function useBand(session: Session | null, forgetSession: () => void): BandProps {
  const counts = useBandCounts(session?.user ?? null);
  const navigate = useNavigate();
  const signOut = useSignOut();
  if (session === null) {
    return {
      home: "/",
      items: [
        { to: "/programme", label: "On the square", icon: "street" },
        { to: "/sign-in", label: "Sign in", icon: "key" },
      ],
    };
  }
  const leave = (everywhere: boolean) =>
    signOut.mutate(
      { everywhere },
      {
        onSuccess: () => {
          forgetSession();
          void navigate("/sign-in");
        },
      },
    );
  const { user } = session;
  const isStudent = user.roles.includes("student");
  const links: BandAccountLink[] = [
    ...(isStudent ? [] : [{ label: "Change password", icon: "key", to: "/account" } as const]),
    { label: "Sign out", icon: "sign-out", onPress: () => leave(false) },
    { label: "Sign out everywhere", icon: "lock", onPress: () => leave(true) },
  ];
  return {
    home: homeOf(user.roles),
    items: bandItems(user, counts),
    account: { name: user.displayName, ...(isStudent && user.classes[0] && { detail: user.classes[0].name }), links },
    isWide: !isStudent,
  };
}
