import type { Page } from "playwright-core";

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
  readonly as: "student" | "teacher" | "coordinator" | "admin" | "nobody";
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
