import { QueryClient, QueryClientProvider, useQuery } from "@tanstack/react-query";
import { render, screen, waitFor, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { useState } from "react";
import { MemoryRouter } from "react-router";
import { beforeEach, describe, expect, it, vi } from "vitest";
import type { Lineup } from "../../../../shared/contracts/lineup.ts";
import { lineupQuery } from "../api.ts";
import { applyChange, type Change, findSlotAt } from "../model/change.ts";
import { buildLineup, buildSlot } from "../model/lineup.fixture.ts";
import { LineupBoard } from "./lineup-board.tsx";

const NOW = Date.parse("2026-12-07T15:00:00Z");

/** Answers like the server: changes the plan and gives it back; notes what was asked for. */
function serve(plan: Lineup) {
  const requests: { method: string; path: string; body: Record<string, unknown> }[] = [];
  const state = { plan };
  vi.stubGlobal("fetch", (path: string, { method, body }: { method: string; body?: string }) => {
    const sent = JSON.parse(body ?? "{}") as Record<string, unknown>;
    requests.push({ method, path, body: sent });
    const slotId = path.split("/").at(-1) as Lineup["slots"][number]["id"];
    const { nightId, startsAt, isPinned, forwardId } = sent as {
      nightId: never;
      startsAt: string;
      isPinned?: boolean;
      forwardId: never;
    };
    if (method === "POST") {
      const placed = applyChange(state.plan, { kind: "place", forwardId, nightId, startsAt });
      state.plan = {
        ...placed,
        slots: placed.slots.map((slot) => (slot.id === "placing" ? { ...slot, id: "slot-new-1" } : slot)),
      };
    } else if (method !== "GET") {
      const change: Change =
        method === "DELETE"
          ? { kind: "remove", slotId }
          : isPinned === undefined
            ? { kind: "move", slotId, nightId, startsAt }
            : { kind: "pin", slotId, isPinned };
      state.plan = applyChange(state.plan, change);
    }
    return Promise.resolve(
      new Response(JSON.stringify(state.plan), { headers: { "content-type": "application/json" } }),
    );
  });
  return { requests, state };
}

function Screen({ start }: { start: Lineup }) {
  const { data = start } = useQuery({ ...lineupQuery, initialData: start, staleTime: Infinity });
  const [monday, setMonday] = useState("2026-12-07");
  return <LineupBoard lineup={data} monday={monday} onMonday={setMonday} now={NOW} />;
}

function open(start: Lineup) {
  const server = serve(start);
  render(
    <QueryClientProvider client={new QueryClient()}>
      <MemoryRouter>
        <Screen start={start} />
      </MemoryRouter>
    </QueryClientProvider>,
  );
  const cell = (name: RegExp) => within(screen.getByRole("grid")).getByRole("button", { name });
  return { ...server, cell, user: userEvent.setup(), news: () => screen.getByRole("status").textContent ?? "" };
}

beforeEach(() => {
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

const monday1700 = buildSlot("07 17:00 foxes");
const tuesday1700 = buildSlot("08 17:00 snow");

describe("the board by keyboard", () => {
  it("moves a show with Space, arrows and Space, and says each step", async () => {
    const { cell, user, requests, state, news } = open(buildLineup({ slots: [monday1700] }));
    cell(/^Monday 7 December, 17:00: Nine Foxes/).focus();
    await user.keyboard(" ");
    expect(news()).toMatch(/Nine Foxes is picked up/);
    await user.keyboard("{ArrowRight}{ArrowDown}");
    expect(news()).toBe("Tuesday 8 December, 17:20, free.");
    await user.keyboard(" ");
    expect(news()).toBe("Nine Foxes moved to Tuesday 8 December, 17:20.");
    await waitFor(() =>
      expect(requests).toEqual([
        {
          method: "PATCH",
          path: `/api/lineup/slots/${monday1700.id}`,
          body: { nightId: "night-08", startsAt: "17:20", swap: false },
        },
      ]),
    );
    expect(findSlotAt(state.plan, "night-08", "17:20")?.id).toBe(monday1700.id);
    expect(cell(/^Tuesday 8 December, 17:20: Nine Foxes/)).toBe(document.activeElement);
  });

  it("puts nothing anywhere after Escape and gives the focus back", async () => {
    const { cell, user, requests, news } = open(buildLineup({ slots: [monday1700] }));
    cell(/17:00: Nine Foxes/).focus();
    await user.keyboard(" {ArrowRight}{ArrowRight}{Escape}");
    expect(news()).toBe("Nine Foxes stays where it was.");
    expect(cell(/^Monday 7 December, 17:00: Nine Foxes/)).toBe(document.activeElement);
    expect(requests).toEqual([]);
  });

  it("changes places with the show that is there", async () => {
    const { cell, user, requests, news } = open(buildLineup({ slots: [monday1700, tuesday1700] }));
    cell(/17:00: Nine Foxes/).focus();
    await user.keyboard(" {ArrowRight} ");
    expect(news()).toBe("Nine Foxes moved to Tuesday 8 December, 17:00. Slow Snow took its place.");
    await waitFor(() => expect(requests[0]?.body).toMatchObject({ swap: true }));
    expect(cell(/^Monday 7 December, 17:00: Slow Snow/)).toBeTruthy();
  });

  it("pins with P; a pinned show is not picked up and not taken off", async () => {
    const { cell, user, requests, news } = open(buildLineup({ slots: [monday1700] }));
    cell(/17:00: Nine Foxes/).focus();
    await user.keyboard("p");
    await waitFor(() => expect(requests[0]?.body).toMatchObject({ isPinned: true }));
    expect(cell(/Nine Foxes.*pinned/)).toBe(document.activeElement);
    await user.keyboard(" ");
    expect(news()).toMatch(/is pinned. Press P/);
    await user.keyboard("{Delete}");
    expect(news()).toMatch(/is pinned. Take the pin out first/);
    expect(requests).toHaveLength(1);
  });

  it("sends a show back to the tray with Delete, and Undo brings it back", async () => {
    const { cell, user, requests, state, news } = open(buildLineup({ slots: [monday1700] }));
    cell(/17:00: Nine Foxes/).focus();
    await user.keyboard("{Delete}");
    expect(news()).toBe("Nine Foxes is back in the tray.");
    await waitFor(() => expect(screen.getByRole("button", { name: "Undo" }).getAttribute("aria-disabled")).toBeNull());
    await user.click(screen.getByRole("button", { name: "Undo" }));
    await waitFor(() => expect(requests.map((request) => request.method)).toEqual(["DELETE", "POST"]));
    await waitFor(() => expect(findSlotAt(state.plan, "night-07", "17:00")?.forwardId).toBe("foxes"));
  });

  it("carries a show from the tray to the first free time, and on by arrows", async () => {
    const { cell, user, requests } = open(buildLineup({ slots: [monday1700] }));
    screen.getByRole("button", { name: /^Slow Snow\s*, 2:40/ }).focus();
    await user.keyboard(" ");
    await waitFor(() => expect(cell(/^Monday 7 December, 17:20/)).toBe(document.activeElement));
    await user.keyboard("{ArrowDown} ");
    await waitFor(() =>
      expect(requests).toEqual([
        {
          method: "POST",
          path: "/api/lineup/slots",
          body: { forwardId: "snow", nightId: "night-07", startsAt: "17:40" },
        },
      ]),
    );
  });

  it("refuses a taken time for a show of the tray and keeps it picked up", async () => {
    const { user, requests, news } = open(buildLineup({ slots: [monday1700] }));
    screen.getByRole("button", { name: /^Slow Snow\s*, 2:40/ }).focus();
    await user.keyboard(" {ArrowUp} ");
    expect(news()).toMatch(/Nine Foxes is there. Move it first/);
    expect(screen.getByText(/is picked up. Press a time/)).toBeTruthy();
    expect(requests).toEqual([]);
  });

  it("has one place in the tab order at a time", () => {
    open(buildLineup({ slots: [monday1700, tuesday1700] }));
    const stops = within(screen.getByRole("grid"))
      .getAllByRole("button")
      .filter((button) => button.dataset.place !== undefined && button.tabIndex === 0);
    expect(stops).toHaveLength(1);
  });
});

describe("the board without dragging", () => {
  it("places a show by night and time from lists", async () => {
    const { user, requests } = open(buildLineup({ slots: [monday1700] }));
    await user.click(screen.getByRole("button", { name: "Place Slow Snow…" }));
    const dialog = within(screen.getByRole("dialog"));
    await user.selectOptions(dialog.getByLabelText("Night"), "Wednesday 9 December");
    await user.selectOptions(dialog.getByLabelText("Start time"), "17:40, free");
    await user.click(dialog.getByRole("button", { name: "Place it" }));
    await waitFor(() =>
      expect(requests[0]?.body).toEqual({ forwardId: "snow", nightId: "night-09", startsAt: "17:40" }),
    );
  });

  it("makes the smallest fix of a finding", async () => {
    const stop = {
      rule: "overlap",
      severity: "stop",
      slotId: monday1700.id,
      forwardId: monday1700.forwardId,
      cause: "30 s too early",
      sentence: "The show before lasts longer.",
      fix: {
        kind: "move",
        slotId: monday1700.id,
        nightId: monday1700.nightId,
        startsAt: "17:40",
        label: "Move to 17:40",
      },
    } as const;
    const { user, requests } = open(buildLineup({ slots: [monday1700], findings: [stop] }));
    expect(screen.getByRole("button", { name: "Publish" }).getAttribute("aria-disabled")).toBe("true");
    await user.click(screen.getByRole("button", { name: "Move to 17:40" }));
    await waitFor(() => expect(requests[0]?.body).toMatchObject({ startsAt: "17:40" }));
  });
});
