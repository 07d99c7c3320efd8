import { QueryClient, QueryClientProvider, useQuery } from "@tanstack/react-query";
import { render, screen, waitFor } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { MemoryRouter } from "react-router";
import { beforeEach, describe, expect, it, vi } from "vitest";
import { ApiProblem } from "../lib/api-client.ts";
import { QueryView } from "./query-view.tsx";

function Words({ read }: { read: () => Promise<string> }) {
  const query = useQuery({ queryKey: ["words"], queryFn: read, retry: false });
  return (
    <>
      <QueryView query={query} skeleton={<p>Loading the words</p>} errorTitle="The words could not be loaded.">
        {(words) => <p>{words}</p>}
      </QueryView>
      <button onClick={() => void query.refetch()}>again</button>
    </>
  );
}

/** Each answer is taken once, in order. */
function open(...answers: (string | Error)[]) {
  const read = () => {
    const answer = answers.shift();
    return answer instanceof Error ? Promise.reject(answer) : Promise.resolve(answer ?? "");
  };
  render(
    <QueryClientProvider client={new QueryClient()}>
      <MemoryRouter>
        <Words read={read} />
      </MemoryRouter>
    </QueryClientProvider>,
  );
  return userEvent.setup();
}

const broken = new ApiProblem("internal", 500, {
  type: "/problems/internal",
  title: "Something broke on our side.",
  status: 500,
  instance: "req-7",
});

beforeEach(() => {
  // jsdom draws nothing; the not-found page has a street.
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
      unobserve() {}
    },
  );
});

describe("QueryView", () => {
  it("shows the skeleton first, then the content", async () => {
    open("four words");
    expect(screen.getByText("Loading the words")).toBeTruthy();
    expect(await screen.findByText("four words")).toBeTruthy();
  });

  it("says what failed with the request's number, and tries again", async () => {
    const user = open(broken, "four words");
    const alert = await screen.findByRole("alert");
    expect(alert.textContent).toContain("The words could not be loaded.");
    expect(alert.textContent).toContain("req-7");
    await user.click(screen.getByRole("button", { name: "Try again" }));
    expect(await screen.findByText("four words")).toBeTruthy();
  });

  it("keeps the content when a later refresh fails", async () => {
    const user = open("four words", broken);
    await screen.findByText("four words");
    await user.click(screen.getByRole("button", { name: "again" }));
    await waitFor(() => expect(screen.queryByRole("alert")).toBeNull());
    expect(screen.getByText("four words")).toBeTruthy();
  });

  it("is the not-found page for what is not there", async () => {
    open(new ApiProblem("not-found", 404, null));
    expect(await screen.findByRole("heading", { level: 1 })).toBeTruthy();
    expect(screen.queryByRole("button", { name: "Try again" })).toBeNull();
  });

  it("says that nothing is lost while the server does not answer", async () => {
    open(new ApiProblem("offline", 0, null));
    expect((await screen.findByRole("alert")).textContent).toContain("Nothing is lost");
  });
});
