import { AppShell } from "../components/app-shell.tsx";
import { LoadingPage } from "../components/loading-page.tsx";
import { RouteError } from "../components/route-error.tsx";

const BARE_BAND = { home: "/", items: [] };

/** Shown while the session and the first page are fetched. */
export function FirstLoad() {
  return (
    <AppShell band={BARE_BAND}>
      <LoadingPage />
    </AppShell>
  );
}

/** Shown when the shell itself fails. */
export function RootError() {
  return (
    <AppShell band={BARE_BAND}>
      <RouteError />
    </AppShell>
  );
}
