import type { Page } from "playwright-core";
import type { Visitor } from "./sign-in.ts";

/** An API answer put in place of the server's, to bring a page into a state. */
export interface Fake {
  /** Path of the endpoint as a glob: `/api/shows*`. */
  readonly url: string;
  readonly status?: number;
  readonly body: unknown;
}

/** Why a state does not exist on a page, in a sentence. */
export type Without = { readonly none: string };

/** One page of the router's table, with how to bring it into each of its states. */
export interface PageCheck {
  readonly as: Visitor;
  /** The address to open; pages of one object look its id up. Called with a signed-in page. */
  readonly open: string | ((page: Page) => Promise<string>);
  readonly empty: readonly Fake[] | Without;
  /** The request that fails. */
  readonly error: string | Without;
  /** Opens one dialog, menu or card over the page. */
  readonly dialog: ((page: Page) => Promise<void>) | Without;
}

const NO_DIALOG: Without = { none: "The page opens nothing over itself." };
const NO_REQUEST: Without = { none: "The page asks the server for nothing of its own." };

/** Reads JSON of the API with the page's own session. */
async function read<T>(page: Page, path: string): Promise<T> {
  const response = await page.request.get(path, { headers: { "sec-fetch-site": "same-origin" } });
  return (await response.json()) as T;
}

interface Listed {
  shows: { id: string; title: string; assignmentId: string | null }[];
  assignments: {
    id: string;
    title: string;
    firstSubmissionId?: string | null;
    mine?: { submissionId: string | null } | null;
  }[];
  classes: { id: string }[];
  lessons: { id: string }[];
  forwards: { id: string; state: string }[];
}

function first<T>(list: readonly T[]): T {
  const [one] = list;
  if (one === undefined) throw new Error("The demo world has none of these.");
  return one;
}

const openMenu = (name: string) => async (page: Page) => {
  await page.getByRole("button", { name }).first().click();
};

/** Every path of the route table has its entry here; the accessibility test fails for one that has none. */
export const PAGES: Readonly<Record<string, PageCheck>> = {
  "/": {
    as: "nobody",
    open: "/",
    empty: { none: "It leads on to another page." },
    error: { none: "It leads on to another page." },
    dialog: NO_DIALOG,
  },
  "/sign-in": {
    as: "nobody",
    open: "/sign-in",
    empty: { none: "A form is never empty of its fields." },
    error: "/api/auth/student-sign-in",
    dialog: NO_DIALOG,
  },
  "/home": {
    as: "student",
    open: "/home",
    empty: [
      { url: "/api/shows*", body: { shows: [] } },
      { url: "/api/assignments", body: { assignments: [] } },
    ],
    error: "/api/shows*",
    dialog: openMenu("Wren"),
  },
  "/shows": {
    as: "student",
    open: "/shows",
    empty: [{ url: "/api/shows*", body: { shows: [] } }],
    error: "/api/shows*",
    dialog: openMenu("Wren"),
  },
  "/shows/new": {
    as: "student",
    open: "/shows/new",
    empty: [{ url: "/api/songs", body: { songs: [] } }],
    error: "/api/songs",
    dialog: openMenu("Wren"),
  },
  "/shows/:showId": {
    as: "student",
    open: async (page) =>
      `/shows/${first((await read<Listed>(page, "/api/shows")).shows.filter((show) => show.assignmentId !== null)).id}`,
    empty: { none: "A show always has a script; an empty one is only a short one." },
    error: "/api/songs/*",
    dialog: openMenu("Hand in"),
  },
  "/assignments/:assignmentId": {
    as: "student",
    open: async (page) => `/assignments/${first((await read<Listed>(page, "/api/assignments")).assignments).id}`,
    empty: { none: "An assignment always has a brief." },
    error: "/api/assignments/*",
    dialog: openMenu("Wren"),
  },
  "/lessons": {
    as: "student",
    open: "/lessons",
    empty: [{ url: "/api/lessons", body: { lessons: [] } }],
    error: "/api/lessons",
    dialog: openMenu("Wren"),
  },
  "/lessons/:lessonId": {
    as: "student",
    open: async (page) => `/lessons/${first((await read<Listed>(page, "/api/lessons")).lessons).id}`,
    empty: { none: "A lesson always has steps." },
    error: "/api/lessons/*",
    dialog: openMenu("Wren"),
  },
  "/words": {
    as: "student",
    open: "/words",
    empty: { none: "The language always has its words." },
    error: "/api/square",
    dialog: openMenu("Wren"),
  },
  "/programme": {
    as: "nobody",
    open: "/programme",
    empty: [
      {
        url: "/api/programme",
        body: {
          eventName: "Quillhaven Winter Lights",
          townName: "Quillhaven",
          timeZone: "America/New_York",
          tonight: "2026-12-01",
          publishedAt: null,
          nights: [],
          shows: [],
        },
      },
    ],
    error: "/api/programme",
    dialog: NO_DIALOG,
  },
  "/classes": {
    as: "teacher",
    open: "/classes",
    empty: [{ url: "/api/classes", body: { classes: [] } }],
    error: "/api/classes",
    dialog: { none: "It opens nothing but the account menu, which the other pages show." },
  },
  "/classes/:classId/:section?": {
    as: "teacher",
    open: async (page) => `/classes/${first((await read<Listed>(page, "/api/classes")).classes).id}`,
    empty: { none: "A class without students shows the same form to add them that the test of the page opens." },
    error: "/api/classes/*",
    dialog: openMenu("Add students"),
  },
  "/classes/:classId/assignments/new": {
    as: "teacher",
    open: async (page) => `/classes/${first((await read<Listed>(page, "/api/classes")).classes).id}/assignments/new`,
    empty: { none: "A form is never empty of its fields." },
    error: "/api/songs",
    dialog: openMenu("Ms Marlow"),
  },
  "/assignments/:assignmentId/edit": {
    as: "teacher",
    open: async (page) => `/assignments/${first((await read<Listed>(page, "/api/assignments")).assignments).id}/edit`,
    empty: { none: "A form is never empty of its fields." },
    error: "/api/assignments/*",
    dialog: openMenu("Ms Marlow"),
  },
  "/marking": {
    as: "teacher",
    open: "/marking",
    empty: [{ url: "/api/marking", body: { assignments: [] } }],
    error: "/api/marking",
    dialog: openMenu("Ms Marlow"),
  },
  "/marking/:assignmentId/:submissionId?": {
    as: "teacher",
    open: async (page) => {
      const { assignments } = await read<Listed>(page, "/api/marking");
      const waiting = first(assignments.filter((one) => typeof one.firstSubmissionId === "string"));
      return `/marking/${waiting.id}/${waiting.firstSubmissionId ?? ""}`;
    },
    empty: [{ url: "/api/assignments/*/submissions", body: { title: "Showpiece", className: "7B", rows: [] } }],
    error: "/api/submissions/*",
    dialog: openMenu("All keys"),
  },
  "/forwarded": {
    as: "teacher",
    open: "/forwarded",
    empty: [{ url: "/api/forwards", body: { forwards: [] } }],
    error: "/api/forwards",
    dialog: openMenu("Ms Marlow"),
  },
  "/forwarded/:forwardId": {
    as: "teacher",
    open: async (page) => `/forwarded/${first((await read<Listed>(page, "/api/forwards")).forwards).id}`,
    empty: { none: "A forwarded show always has a version." },
    error: "/api/forwards/*",
    dialog: openMenu("Ms Marlow"),
  },
  "/event/shows": {
    as: "coordinator",
    open: "/event/shows",
    empty: [{ url: "/api/forwards", body: { forwards: [] } }],
    error: "/api/forwards",
    dialog: openMenu("Petra Holm"),
  },
  "/event/shows/:forwardId": {
    as: "coordinator",
    open: async (page) =>
      `/event/shows/${first((await read<Listed>(page, "/api/forwards")).forwards.filter((one) => one.state === "waiting")).id}`,
    empty: { none: "A forwarded show always has a version." },
    error: "/api/forwards/*",
    dialog: openMenu("Send back"),
  },
  "/lineup": {
    as: "coordinator",
    open: "/lineup",
    empty: { none: "The board of a season always has nights; its tray says itself when it is empty." },
    error: "/api/lineup",
    dialog: async (page) => {
      await page
        .getByRole("button", { name: /^Place / })
        .first()
        .click();
    },
  },
  "/admin": {
    as: "admin",
    open: "/admin",
    empty: { none: "There is always the admin who looks at it." },
    error: "/api/admin/overview",
    dialog: openMenu("Aron Quist"),
  },
  "/admin/audit": {
    as: "admin",
    open: "/admin/audit",
    empty: [{ url: "/api/admin/audit*", body: { rows: [], hasMore: false, isChainWhole: true } }],
    error: "/api/admin/audit*",
    dialog: openMenu("Aron Quist"),
  },
  "/account": {
    as: "teacher",
    open: "/account",
    empty: { none: "A form is never empty of its fields." },
    error: NO_REQUEST,
    dialog: openMenu("Ms Marlow"),
  },
  "/design": {
    as: "nobody",
    open: "/design",
    empty: { none: "It lists the components." },
    error: NO_REQUEST,
    dialog: NO_DIALOG,
  },
  "*": {
    as: "nobody",
    open: "/nowhere",
    empty: { none: "It says that nothing is here." },
    error: NO_REQUEST,
    dialog: NO_DIALOG,
  },
};
