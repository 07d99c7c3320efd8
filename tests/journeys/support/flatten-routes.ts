import type { RouteObject } from "react-router";
import { routes } from "../../../src/route-table.tsx";

/** The path of every page in the router's own table. */
export function flattenRoutes(table: readonly RouteObject[] = routes): string[] {
  return table.flatMap((route) => [
    ...(route.path === undefined ? [] : [route.path]),
    ...flattenRoutes(route.children ?? []),
  ]);
}
