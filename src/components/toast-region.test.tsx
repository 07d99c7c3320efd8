import { act, render, screen } from "@testing-library/react";
import { userEvent } from "@testing-library/user-event";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { dismissToast, listToasts, showToast } from "./toast-queue.ts";
import { ToastRegion } from "./toast-region.tsx";

beforeEach(() => {
  vi.useFakeTimers({ shouldAdvanceTime: true });
  render(<ToastRegion />);
});
afterEach(() => {
  vi.useRealTimers();
  for (const toast of listToasts()) dismissToast(toast.id);
});

describe("ToastRegion", () => {
  it("is a polite live region before anything is said", () => {
    expect(screen.getByRole("status").getAttribute("aria-live")).toBe("polite");
  });

  it("says news and takes it away after its reading time", () => {
    act(() => void showToast({ title: "Saved." }));
    expect(screen.getByText("Saved.")).toBeTruthy();
    act(() => void vi.advanceTimersByTime(8_000));
    expect(screen.queryByText("Saved.")).toBeNull();
  });

  it("keeps a failure until it is closed", async () => {
    act(() => void showToast({ tone: "stop", title: "The mark was not released." }));
    act(() => void vi.advanceTimersByTime(60_000));
    await userEvent.click(screen.getByRole("button", { name: "Close: The mark was not released." }));
    expect(screen.queryByText("The mark was not released.")).toBeNull();
  });

  it("keeps an offer until it is taken, then does it once", async () => {
    const onPress = vi.fn();
    act(() => void showToast({ title: "Nine Foxes went to the tray.", action: { label: "Undo", onPress } }));
    act(() => void vi.advanceTimersByTime(60_000));
    await userEvent.click(screen.getByRole("button", { name: "Undo" }));
    expect(onPress).toHaveBeenCalledTimes(1);
    expect(listToasts()).toHaveLength(0);
  });

  it("shows the newest three", () => {
    act(() => ["one", "two", "three", "four"].forEach((title) => showToast({ title })));
    expect(listToasts().map((toast) => toast.title)).toEqual(["two", "three", "four"]);
  });
});
