import type { ReactNode } from "react";
import { ScrollRestoration } from "react-router";
import { useNavigationFocus } from "../hooks/use-navigation-focus.ts";
import { Band, type BandProps } from "./band.tsx";
import { SkipLink } from "./skip-link.tsx";
import { ToastRegion } from "./toast-region.tsx";

export interface AppShellProps {
  /** Left out on pages that bring their own head (sign-in, studio). */
  band?: BandProps;
  /** Under the page, after the content. */
  footer?: ReactNode;
  children: ReactNode;
}

/** What stands round every page: skip link, band, main landmark, toasts; focus and scroll at navigation. */
export function AppShell({ band, footer, children }: AppShellProps) {
  useNavigationFocus();
  return (
    <>
      <SkipLink />
      {band && <Band {...band} />}
      <main id="main" tabIndex={-1} className="flex min-h-0 w-full flex-1 flex-col outline-none">
        {children}
      </main>
      {footer}
      <ToastRegion />
      <ScrollRestoration />
    </>
  );
}
