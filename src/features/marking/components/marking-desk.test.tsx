import { QueryClient, QueryClientProvider, useQuery } from "@tanstack/react-query";
import { render, screen, waitFor, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { MemoryRouter } from "react-router";
import { beforeEach, describe, expect, it, vi } from "vitest";
import type { SubmissionDetail } from "../../../../shared/contracts/marking.ts";
import { listToasts } from "../../../components/toast-queue.ts";
import { submissionQuery } from "../api.ts";
import { buildQueueRow, buildSubmission } from "../model/marking.fixture.ts";
import { MarkingDesk } from "./marking-desk.tsx";

const NOW = Date.parse("2026-12-02T15:00:00Z");
const BARS = [0, 1, 2, 3].map((bar) => ({ number: bar + 1, start: bar * 4, beats: 4 }));

/** Answers like the server and notes what was asked for. */
function serve(start: SubmissionDetail) {
  const requests: { method: string; path: string; body: Record<string, unknown> | null }[] = [];
  let detail = start;
  const answer = (path: string, sent: Record<string, unknown> | null) => {
    if (path.endsWith("/mark")) {
      detail = {
        ...detail,
        mark: {
          levels: sent?.levels as Record<string, number>,
          note: String(sent?.note),
          got: 9,
          of: 12,
          isReleased: false,
        },
      };
      return { mark: detail.mark };
    }
    if (path.endsWith("/release")) {
      detail = { ...detail, submission: { ...detail.submission, state: "marked" } };
      return { state: "marked", mark: detail.mark };
    }
    if (path.endsWith("/reopen")) return { state: "submitted" };
    if (path.endsWith("/comments"))
      return {
        comment: {
          id: "comment-new",
          authorName: "Ms Marlow",
          isMine: true,
          isTeacher: true,
          versionNumber: 3,
          anchor: sent?.anchor,
          body: sent?.body,
          createdAt: NOW,
        },
      };
    return detail;
  };
  vi.stubGlobal("fetch", (path: string, { method, body }: { method: string; body?: string }) => {
    const sent = body ? (JSON.parse(body) as Record<string, unknown>) : null;
    requests.push({ method, path, body: sent });
    return Promise.resolve(
      new Response(JSON.stringify(answer(path, sent)), { headers: { "content-type": "application/json" } }),
    );
  });
  return requests;
}

interface ScreenProps {
  start: SubmissionDetail;
  onGo: (id: string) => void;
  toggle: () => void;
}

function Screen({ start, onGo, toggle }: ScreenProps) {
  const { id } = start.submission;
  const { data = start } = useQuery({ ...submissionQuery(id), initialData: start, staleTime: Infinity });
  return (
    <MarkingDesk
      queue={{
        title: "A show with a chorus",
        className: "7B",
        rows: [buildQueueRow("ada"), buildQueueRow(id), buildQueueRow("june")],
      }}
      detail={data}
      timeZone="America/New_York"
      now={NOW}
      playback={{
        endTick: 15_360,
        getTick: () => 4_800,
        seekTick: () => undefined,
        toggle,
        subscribe: () => () => undefined,
      }}
      timeline={null}
      song={{ bars: BARS }}
      stage={null}
      transport={null}
      renderScript={({ notes, onPickLine }) => (
        <div>
          <button onClick={() => onPickLine(6)}>Line 6</button>
          {notes.get(6)}
        </div>
      )}
      onShowLine={() => undefined}
      forwarding={null}
      toRow={(row) => `/marking/chorus/${row}`}
      onGo={onGo}
    />
  );
}

let opened = 0;

function open(change: (start: SubmissionDetail) => SubmissionDetail = (start) => start) {
  // Drafts outlive the page, so every test has a submission of its own.
  opened += 1;
  const start = change(buildSubmission(`wren-${opened}`));
  const requests = serve(start);
  const onGo = vi.fn();
  const toggle = vi.fn();
  render(
    <QueryClientProvider client={new QueryClient()}>
      <MemoryRouter>
        <Screen start={start} onGo={onGo} toggle={toggle} />
      </MemoryRouter>
    </QueryClientProvider>,
  );
  const chosen = (criterion: RegExp) =>
    within(screen.getByRole("group", { name: criterion }))
      .queryByRole("radio", { checked: true })
      ?.getAttribute("value") ?? null;
  return { requests, onGo, toggle, chosen, user: userEvent.setup() };
}

beforeEach(() => {
  window.localStorage.clear();
  window.HTMLElement.prototype.scrollIntoView = () => undefined;
  vi.stubGlobal("matchMedia", () => ({
    matches: false,
    addEventListener: () => undefined,
    removeEventListener: () => undefined,
  }));
  vi.stubGlobal(
    "ResizeObserver",
    class {
      observe() {}
      disconnect() {}
      unobserve() {}
    },
  );
});

describe("the desk by keys", () => {
  it("sets levels down the rubric, one key a criterion, and saves them by itself", async () => {
    const { user, chosen, requests } = open();
    await user.keyboard("342");
    expect([chosen(/Fits the song/), chosen(/Uses a loop well/), chosen(/Uses the square/)]).toEqual(["3", "4", "2"]);
    expect(screen.getByText("9 of 12")).toBeTruthy();
    await waitFor(
      () =>
        expect(requests.at(-1)).toMatchObject({
          method: "PUT",
          body: { levels: { song: 3, loop: 4, square: 2 }, note: "" },
        }),
      { timeout: 3_000 },
    );
    await waitFor(() => expect(screen.getByText(/^Saved/)).toBeTruthy());
  });

  it("goes on from the criterion that has the focus", async () => {
    const { user, chosen } = open();
    await user.click(
      within(screen.getByRole("group", { name: /Uses a loop well/ })).getByRole("radio", { name: "yes" }),
    );
    await user.keyboard("14");
    expect([chosen(/Fits the song/), chosen(/Uses a loop well/), chosen(/Uses the square/)]).toEqual([null, "1", "4"]);
  });

  it("goes along the queue with J and K and plays with Space", async () => {
    const { user, onGo, toggle } = open();
    await user.keyboard("j");
    await user.keyboard("k");
    await user.keyboard(" ");
    expect(onGo.mock.calls).toEqual([["june"], ["ada"]]);
    expect(toggle).toHaveBeenCalledTimes(1);
  });

  it("writes letters and digits in the note instead of acting on them", async () => {
    const { user, chosen, onGo } = open();
    const note = screen.getByLabelText("To Wren and Idris");
    await user.type(note, "1 jig");
    expect(note).toHaveProperty("value", "1 jig");
    expect(chosen(/Fits the song/)).toBeNull();
    expect(onGo).not.toHaveBeenCalled();
  });

  it("does nothing with single keys once they are turned off, but ? still shows them", async () => {
    const { user, chosen } = open();
    await user.keyboard("?");
    await user.click(within(screen.getByRole("dialog")).getByRole("checkbox", { name: /Use single keys/ }));
    await user.keyboard("{Escape}3");
    expect(chosen(/Fits the song/)).toBeNull();
    await user.keyboard("?");
    await user.click(within(screen.getByRole("dialog")).getByRole("checkbox", { name: /Use single keys/ }));
    await user.keyboard("{Escape}3");
    expect(chosen(/Fits the song/)).toBe("3");
  });
});

describe("releasing", () => {
  it("is refused with its reason while a criterion has no level", async () => {
    const { user, requests } = open();
    await user.keyboard("34g");
    const release = screen.getByRole("button", { name: "Release mark" });
    expect(release.getAttribute("aria-disabled")).toBe("true");
    expect(screen.getByText("“Uses the square” has no level yet.")).toBeTruthy();
    expect(listToasts().map((toast) => toast.detail)).toContain("“Uses the square” has no level yet.");
    expect(requests.some((request) => request.path.endsWith("/release"))).toBe(false);
  });

  it("sends what is unsaved first, releases once, stays for the forwarding, and goes on with J to what waits", async () => {
    const { user, requests, onGo } = open();
    const listPosts = () =>
      requests.filter((request) => request.method !== "GET").map((request) => request.path.split("/").at(-1));
    await user.keyboard("333gg");
    await waitFor(() => expect(listPosts()).toEqual(["mark", "release"]));
    await waitFor(() =>
      expect(listToasts().map((toast) => toast.title)).toContain("The mark of Wren and Idris is released."),
    );
    await user.keyboard("j");
    expect(listPosts()).toEqual(["mark", "release"]);
    expect(onGo.mock.calls).toEqual([["june"]]);
  });

  it("shows a released mark fixed, with the way to take it back", () => {
    open((start) => ({
      ...start,
      submission: { ...start.submission, state: "marked" },
      mark: { levels: { song: 3, loop: 3, square: 4 }, note: "Well done.", got: 10, of: 12, isReleased: true },
    }));
    expect(screen.getByText("10 of 12")).toBeTruthy();
    expect(screen.queryAllByRole("radio")).toEqual([]);
    expect(screen.getByRole("button", { name: "Take the mark back" })).toBeTruthy();
  });
});

describe("comments", () => {
  it("stand below the line they were written on", async () => {
    const { user, requests } = open();
    await user.click(screen.getByRole("button", { name: "Line 6" }));
    await user.type(screen.getByLabelText("Comment on line 6"), "Good name for the speed.");
    await user.keyboard("{Control>}{Enter}{/Control}");
    await waitFor(() => expect(screen.getByText(/Good name for the speed/)).toBeTruthy());
    expect(requests.find((request) => request.path.endsWith("/comments"))?.body).toEqual({
      anchor: { kind: "lines", from: 6, to: 6 },
      body: "Good name for the speed.",
    });
  });

  it("open with C at the moment that plays, and keep unsent words for the next time", async () => {
    const { user } = open();
    await user.keyboard("c");
    await user.type(screen.getByLabelText("Comment on bar 2"), "Here it is");
    await user.keyboard("{Escape}");
    expect(screen.queryByLabelText("Comment on bar 2")).toBeNull();
    await user.keyboard("c");
    expect(screen.getByLabelText("Comment on bar 2")).toHaveProperty("value", "Here it is");
  });
});
