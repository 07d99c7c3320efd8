import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { render, screen, waitFor } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { describe, expect, it, vi } from "vitest";
import type { Partners } from "../../../../shared/contracts/partners.ts";
import type { ShowSummary } from "../../../../shared/contracts/shows.ts";
import { AssignmentIdSchema, ShowIdSchema, SongIdSchema, UserIdSchema } from "../../../../shared/ids.ts";
import { listToasts } from "../../../components/toast-queue.ts";
import { Invitations } from "./invitations.tsx";
import { PartnersDialog } from "./partners-dialog.tsx";

const SHOW: ShowSummary = {
  id: ShowIdSchema.parse("show-nine-foxes"),
  title: "Nine Foxes",
  songId: SongIdSchema.parse("song-bells"),
  songTitle: "Quillhaven Bells",
  seconds: 130,
  authors: ["Wren"],
  assignmentId: AssignmentIdSchema.parse("assignment-chorus"),
  assignmentTitle: "A show with a chorus",
  workState: "working",
  forwardState: null,
  savedAt: 0,
  isArchived: false,
  ribbon: null,
};
const person = (name: string) => ({ userId: UserIdSchema.parse(`user-${name.toLowerCase()}`), name });
const ALONE: Partners = {
  authors: [{ ...person("Wren"), isMe: true }],
  asked: [],
  classmates: [person("Ash"), person("June")],
  obstacle: null,
};

interface Answer {
  readonly status?: number;
  readonly body: unknown;
}

/** Answers by method and path, and notes what was asked for. */
function serve(answer: (method: string, path: string) => Answer) {
  const requests: string[] = [];
  vi.stubGlobal("fetch", (path: string, { method, body }: { method: string; body?: string }) => {
    requests.push([method, path, body].filter(Boolean).join(" "));
    const { status = 200, body: reply } = answer(method, path);
    const type = status < 400 ? "application/json" : "application/problem+json";
    return Promise.resolve(new Response(JSON.stringify(reply), { status, headers: { "content-type": type } }));
  });
  return requests;
}

function open(element: React.ReactElement) {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  render(<QueryClientProvider client={client}>{element}</QueryClientProvider>);
  return userEvent.setup();
}

describe("writing together", () => {
  it("asks a classmate, who then stands there unanswered", async () => {
    const requests = serve((method) => ({
      body: method === "POST" ? { ...ALONE, asked: [person("Ash")], classmates: [person("June")] } : ALONE,
    }));
    const user = open(<PartnersDialog show={SHOW} onClose={vi.fn()} />);
    await user.selectOptions(await screen.findByLabelText("Ask a classmate"), "Ash");
    await user.click(screen.getByRole("button", { name: "Ask" }));
    expect(await screen.findByText("asked, no answer yet")).toBeTruthy();
    expect(screen.getByRole("button", { name: "Do not ask Ash" })).toBeTruthy();
    expect(requests.at(-1)).toBe('POST /api/shows/show-nine-foxes/partners {"userId":"user-ash"}');
  });

  it("says why nobody can be asked", async () => {
    serve(() => ({
      body: { ...ALONE, obstacle: "It is handed in. The authors stay as they are until it comes back." },
    }));
    open(<PartnersDialog show={SHOW} onClose={vi.fn()} />);
    expect(await screen.findByText(/It is handed in/)).toBeTruthy();
    expect(screen.queryByLabelText("Ask a classmate")).toBeNull();
  });

  it("asks before it leaves, and closes when it has", async () => {
    const onClose = vi.fn();
    serve((method) => ({
      body:
        method === "POST"
          ? { copyId: "show-copy" }
          : { ...ALONE, authors: [...ALONE.authors, { ...person("Ash"), isMe: false }] },
    }));
    const user = open(<PartnersDialog show={SHOW} onClose={onClose} />);
    await user.click(await screen.findByRole("button", { name: "Leave" }));
    expect(onClose).not.toHaveBeenCalled();
    await user.click(screen.getByRole("button", { name: "Leave it" }));
    await waitFor(() => expect(onClose).toHaveBeenCalled());
  });
});

describe("being asked", () => {
  const invitation = {
    showId: SHOW.id,
    title: SHOW.title,
    songTitle: SHOW.songTitle,
    assignmentTitle: SHOW.assignmentTitle,
    by: "Wren",
    askedAt: 0,
  };

  it("joins", async () => {
    const requests = serve((method) => ({
      body: method === "POST" ? { isAuthor: true } : { invitations: [invitation] },
    }));
    const user = open(<Invitations />);
    await user.click(await screen.findByRole("button", { name: "Join" }));
    await waitFor(() =>
      expect(listToasts().map((toast) => toast.title)).toContain("You write “Nine Foxes” with Wren."),
    );
    expect(requests).toContain('POST /api/shows/show-nine-foxes/invitation {"answer":"join"}');
  });

  it("shows why it could not", async () => {
    const detail = "You have begun a show of your own for this assignment. Archive it first, then join.";
    serve((method) =>
      method === "POST"
        ? { status: 409, body: { type: "/problems/wrong-state", title: "No.", status: 409, detail } }
        : { body: { invitations: [invitation] } },
    );
    const user = open(<Invitations />);
    await user.click(await screen.findByRole("button", { name: "Join" }));
    expect((await screen.findByRole("alert")).textContent).toBe(detail);
  });
});
