import { QueryClient } from "@tanstack/react-query";

const STALE_AFTER_MS = 30_000;
const READ_ATTEMPTS = 3;

/** A failure with a status below 500 is an answer (not found, not allowed): asking again changes nothing. */
function isAnswer(error: unknown): boolean {
  return (
    typeof error === "object" &&
    error !== null &&
    "status" in error &&
    typeof error.status === "number" &&
    error.status > 0 &&
    error.status < 500
  );
}

/** A fresh client: reads are tried three times unless the server answered, writes once. */
export function createQueryClient(): QueryClient {
  return new QueryClient({
    defaultOptions: {
      // The browser's own idea of being online keeps requests back; ours fail at once, and what is kept answers.
      queries: {
        networkMode: "always",
        staleTime: STALE_AFTER_MS,
        retry: (failures, error) => !isAnswer(error) && failures < READ_ATTEMPTS - 1,
      },
      mutations: { networkMode: "always", retry: false },
    },
  });
}

/** The client of this page. Route loaders and components share it. */
export const queryClient = createQueryClient();
