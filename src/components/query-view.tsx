import type { UseQueryResult } from "@tanstack/react-query";
import type { ReactNode } from "react";
import { ErrorState } from "./error-state.tsx";
import { NotFoundPage } from "./not-found-page.tsx";

export interface QueryViewProps<Data> {
  query: UseQueryResult<Data>;
  /** What stands there while it loads: skeletons in the shape of what will come. */
  skeleton: ReactNode;
  /** "The class could not be loaded." */
  errorTitle: string;
  /** Round the message when it stands alone: a Page with its h1. */
  frame?: (message: ReactNode) => ReactNode;
  children: (data: Data) => ReactNode;
}

/** One query on a page: skeleton, then content; what failed can be tried again; what is not there is the not-found page. */
export function QueryView<Data>({
  query,
  skeleton,
  errorTitle,
  frame = (message) => message,
  children,
}: QueryViewProps<Data>) {
  // Content that is here already stays, even when a later refresh failed.
  if (query.data !== undefined) return <>{children(query.data)}</>;
  if (!query.isError) return <>{skeleton}</>;
  const { error } = query;
  if ("status" in error && error.status === 404) return <NotFoundPage />;
  const isOffline = "slug" in error && error.slug === "offline";
  return frame(
    <ErrorState
      title={errorTitle}
      onRetry={() => void query.refetch()}
      isRetrying={query.isFetching}
      requestId={"requestId" in error && typeof error.requestId === "string" ? error.requestId : null}
    >
      <p>
        {isOffline ? "The server does not answer. Nothing is lost; try again when the network is back." : error.message}
      </p>
    </ErrorState>,
  );
}
