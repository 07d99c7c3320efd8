import { render, screen } from "@testing-library/react";
import { userEvent } from "@testing-library/user-event";
import { createMemoryRouter, Outlet, RouterProvider } from "react-router";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { AppShell } from "./app-shell.tsx";
import type { BandProps } from "./band.tsx";
import { Page, PageHeader } from "./page.tsx";

const signOut = vi.fn();

const BAND: BandProps = {
  home: "/",
  items: [
    { to: "/home", icon: "home", label: "Home" },
    { to: "/marking", icon: "pencil", label: "Marking", count: 43, countLabel: "to mark" },
  ],
  account: { name: "Wren", detail: "7B", links: [{ label: "Sign out", icon: "sign-out", onPress: signOut }] },
};

function renderShell() {
  const page = (title: string) => (
    <Page title={title}>
      <PageHeader title={title} />
    </Page>
  );
  const router = createMemoryRouter(
    [
      {
        element: (
          <AppShell band={BAND}>
            <Outlet />
          </AppShell>
        ),
        children: [
          { path: "/home", element: page("Home page") },
          { path: "/marking", element: page("Marking page") },
        ],
      },
    ],
    { initialEntries: ["/home"] },
  );
  render(<RouterProvider router={router} />);
}

beforeEach(() => {
  // jsdom draws nothing: it has no media queries and no scrolling.
  vi.stubGlobal("matchMedia", () => ({
    matches: false,
    addEventListener: () => undefined,
    removeEventListener: () => undefined,
  }));
  vi.stubGlobal("scrollTo", () => undefined);
});
afterEach(() => vi.unstubAllGlobals());

const focused = () => document.activeElement;

describe("AppShell", () => {
  it("begins with a link past the navigation to the page", async () => {
    renderShell();
    await userEvent.tab();
    expect(focused()).toBe(screen.getByRole("link", { name: "Skip to the page" }));
    await userEvent.keyboard("{Enter}");
    expect(focused()).toBe(screen.getByRole("main"));
  });

  it("leaves the focus alone on the first page", () => {
    renderShell();
    expect(focused()).toBe(document.body);
    expect(document.title).toBe("Home page · Duskbell");
  });

  it("after a navigation gives the focus to the new h1 and sets the title", async () => {
    renderShell();
    await userEvent.click(screen.getByRole("link", { name: "Marking 43 to mark" }));
    expect(focused()).toBe(screen.getByRole("heading", { level: 1, name: "Marking page" }));
    expect(document.title).toBe("Marking page · Duskbell");
    expect(screen.getByRole("link", { name: "Marking 43 to mark" }).getAttribute("aria-current")).toBe("page");
    expect(screen.getByRole("link", { name: "Home" }).getAttribute("aria-current")).toBeNull();
  });
});

describe("Band", () => {
  it("opens the account's menu and on Escape gives the focus back to the name", async () => {
    renderShell();
    const name = screen.getByRole("button", { name: "Wren · 7B" });
    await userEvent.click(name);
    expect(name.getAttribute("aria-expanded")).toBe("true");
    await userEvent.tab();
    expect(focused()).toBe(screen.getByRole("button", { name: "Sign out" }));
    await userEvent.keyboard("{Escape}");
    expect(focused()).toBe(name);
    expect(screen.queryByRole("button", { name: "Sign out" })).toBeNull();
  });

  it("acts and closes when an entry is used", async () => {
    renderShell();
    await userEvent.click(screen.getByRole("button", { name: "Wren · 7B" }));
    await userEvent.click(screen.getByRole("button", { name: "Sign out" }));
    expect(signOut).toHaveBeenCalledTimes(1);
    expect(screen.queryByRole("button", { name: "Sign out" })).toBeNull();
  });

  it("keeps navigation and account in one menu for narrow windows", async () => {
    renderShell();
    const menu = screen.getByRole("button", { name: "Menu" });
    await userEvent.click(menu);
    expect(menu.getAttribute("aria-expanded")).toBe("true");
    expect(screen.getAllByRole("link", { name: "Marking 43 to mark" })).toHaveLength(2);
    expect(screen.getByRole("button", { name: "Sign out" })).toBeTruthy();
    await userEvent.keyboard("{Escape}");
    expect(focused()).toBe(menu);
  });

  it("closes the menu when the focus goes on into the page", async () => {
    renderShell();
    await userEvent.click(screen.getByRole("button", { name: "Wren · 7B" }));
    await userEvent.click(screen.getByRole("heading", { level: 1 }));
    expect(screen.queryByRole("button", { name: "Sign out" })).toBeNull();
  });
});
