import { Outlet } from "react-router";
import { AppShell } from "../components/app-shell.tsx";

/** The shell round every page. */
export function Root() {
  return (
    <AppShell band={{ home: "/", items: [] }}>
      <Outlet />
    </AppShell>
  );
}
