import { useEffect, useRef } from "react";
import { useLocation, useNavigation } from "react-router";

/**
 * After a navigation to another path, gives the focus to the new page's h1 (or to <main>), so that a
 * screen reader says where it is and the keyboard starts there. A change of the query alone moves nothing.
 */
export function useNavigationFocus() {
  const { pathname } = useLocation();
  const { state } = useNavigation();
  const lastPath = useRef(pathname);

  useEffect(() => {
    if (state !== "idle" || lastPath.current === pathname) return;
    lastPath.current = pathname;
    const heading = document.querySelector<HTMLElement>("main h1");
    if (heading && !heading.hasAttribute("tabindex")) heading.tabIndex = -1;
    (heading ?? document.getElementById("main"))?.focus({ preventScroll: true });
  }, [pathname, state]);
}
