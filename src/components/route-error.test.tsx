import { render, screen } from "@testing-library/react";
import { createMemoryRouter, RouterProvider } from "react-router";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { ApiProblem } from "../lib/api-client.ts";
import { RouteError } from "./route-error.tsx";

function renderFailure(thrown: unknown) {
  const router = createMemoryRouter([
    {
      path: "/",
      loader: () => {
        throw thrown;
      },
      element: <p>Page</p>,
      ErrorBoundary: RouteError,
      HydrateFallback: () => null,
    },
  ]);
  render(<RouterProvider router={router} />);
}

beforeEach(() => {
  vi.stubGlobal("matchMedia", () => ({
    matches: true,
    addEventListener: () => undefined,
    removeEventListener: () => undefined,
  }));
  vi.stubGlobal(
    "ResizeObserver",
    class {
      observe() {}
      disconnect() {}
    },
  );
  // The router logs what it catches.
  vi.spyOn(console, "error").mockImplementation(() => undefined);
});
afterEach(() => {
  vi.unstubAllGlobals();
  vi.restoreAllMocks();
});

describe("RouteError", () => {
  it("turns a 404 into the not-found page", async () => {
    renderFailure(new Response(null, { status: 404 }));
    expect(await screen.findByRole("heading", { level: 1, name: "This page is not here" })).toBeTruthy();
    expect(screen.getByRole("link", { name: "Go to the start" })).toBeTruthy();
  });

  it("says that the role is missing at a 403", async () => {
    renderFailure(new ApiProblem("unknown", 403, null));
    expect(await screen.findByRole("heading", { level: 1, name: "This page is not open to you" })).toBeTruthy();
  });

  it("says that the server is out of reach and offers to try again", async () => {
    renderFailure(new ApiProblem("offline", 0, null));
    expect((await screen.findByRole("alert")).textContent).toContain("The server cannot be reached.");
    expect(screen.getByRole("button", { name: "Try again" })).toBeTruthy();
  });

  it("quotes the request's id at a fault of the server", async () => {
    renderFailure(
      new ApiProblem("unknown", 500, { type: "about:blank", title: "Fault", status: 500, instance: "req-7f3a21" }),
    );
    expect((await screen.findByRole("alert")).textContent).toContain("req-7f3a21");
  });

  it("names a fault of the page itself", async () => {
    renderFailure(new Error("boom"));
    expect((await screen.findByRole("alert")).textContent).toContain("A fault in the page stopped it.");
  });
});
