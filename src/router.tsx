import { createBrowserRouter } from "react-router";
import { routes } from "./route-table.tsx";

/** The router of this page. The table stands apart, so that tests can walk it without a browser. */
export const router = createBrowserRouter(routes);
