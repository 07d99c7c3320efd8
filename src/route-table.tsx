import type { RouteObject } from "react-router";
import { RouteError } from "./components/route-error.tsx";
import { FirstLoad, RootError } from "./routes/root-fallbacks.tsx";
import { loader as rootLoader, Root } from "./routes/root.tsx";

/**
 * The pages. Each is one lazy module in src/routes that exports `Component` and, where it needs them,
 * `loader` and `ErrorBoundary`. Every area has its own boundary, so that a fault in one page leaves
 * the band and the other pages standing.
 */
export const routes: RouteObject[] = [
  {
    loader: rootLoader,
    Component: Root,
    HydrateFallback: FirstLoad,
    ErrorBoundary: RootError,
    children: [
      {
        ErrorBoundary: RouteError,
        children: [
          { path: "/", lazy: () => import("./routes/start.tsx") },
          { path: "/sign-in", handle: { hasOwnHead: true }, lazy: () => import("./routes/sign-in.tsx") },
          { path: "/home", lazy: () => import("./routes/home.tsx") },
          { path: "/shows", lazy: () => import("./routes/shows.tsx") },
          { path: "/shows/new", lazy: () => import("./routes/new-show.tsx") },
          { path: "/shows/:showId", handle: { hasOwnHead: true }, lazy: () => import("./routes/studio.tsx") },
          { path: "/assignments/:assignmentId", lazy: () => import("./routes/assignment.tsx") },
          { path: "/lessons", lazy: () => import("./routes/lessons.tsx") },
          { path: "/lessons/:lessonId", lazy: () => import("./routes/lesson.tsx") },
          { path: "/words", lazy: () => import("./routes/words.tsx") },
          { path: "/programme", lazy: () => import("./routes/programme.tsx") },
          { path: "/classes", lazy: () => import("./routes/classes.tsx") },
          { path: "/classes/:classId/:section?", lazy: () => import("./routes/class.tsx") },
          { path: "/classes/:classId/assignments/new", lazy: () => import("./routes/assignment-form.tsx") },
          { path: "/assignments/:assignmentId/edit", lazy: () => import("./routes/assignment-form.tsx") },
          { path: "/marking", lazy: () => import("./routes/marking-inbox.tsx") },
          { path: "/marking/:assignmentId/:submissionId?", lazy: () => import("./routes/marking.tsx") },
          { path: "/forwarded", lazy: () => import("./routes/forwarded.tsx") },
          { path: "/forwarded/:forwardId", lazy: () => import("./routes/event-show.tsx") },
          { path: "/event/shows", lazy: () => import("./routes/event-shows.tsx") },
          { path: "/event/shows/:forwardId", lazy: () => import("./routes/event-show.tsx") },
          { path: "/lineup", lazy: () => import("./routes/lineup.tsx") },
          { path: "/admin", lazy: () => import("./routes/admin.tsx") },
          { path: "/admin/audit", lazy: () => import("./routes/audit.tsx") },
          { path: "/account", lazy: () => import("./routes/account.tsx") },
          { path: "/design", lazy: () => import("./routes/design.tsx") },
          { path: "*", lazy: () => import("./routes/not-found.tsx") },
        ],
      },
    ],
  },
];
