import { isRouteErrorResponse, useRevalidator, useRouteError } from "react-router";
import { ApiProblem } from "../lib/api-client.ts";
import { ErrorState } from "./error-state.tsx";
import { LinkButton } from "./link-button.tsx";
import { NotFoundPage } from "./not-found-page.tsx";
import { Page, PageHeader } from "./page.tsx";

export interface RouteErrorProps {
  /** What the area is called in a sentence: "The lineup". */
  area?: string;
}

interface Failure {
  status: number | null;
  requestId: string | null;
  /** The browser could not fetch a part of the application: offline, or a newer release is out. */
  isMissingPart: boolean;
}

/** Reads what a page needs from whatever was thrown: a router response, an API problem (status, instance), or a fault. */
function toFailure(error: unknown): Failure {
  if (isRouteErrorResponse(error)) return { status: error.status, requestId: null, isMissingPart: false };
  if (error instanceof ApiProblem) return { status: error.status, requestId: error.requestId, isMissingPart: false };
  return {
    status: null,
    requestId: null,
    isMissingPart: error instanceof TypeError && /module|import/i.test(error.message),
  };
}

function describeFailure({ isMissingPart, status }: Failure): string {
  if (isMissingPart) return "A part of Duskbell could not be fetched.";
  if (status === 0) return "The server cannot be reached.";
  return status === null ? "A fault in the page stopped it." : "The server could not finish this.";
}

/** The boundary of a route area: says what failed, keeps the band, offers to try again. A 404 becomes the not-found page. */
export function RouteError({ area = "This page" }: RouteErrorProps) {
  const failure = toFailure(useRouteError());
  const revalidator = useRevalidator();
  if (failure.status === 404) return <NotFoundPage />;
  if (failure.status === 403) {
    return (
      <Page title="Not allowed">
        <PageHeader
          title={`${area} is not open to you`}
          lead="Your account has no role that may see it. Ask the person who gave you the account."
        />
        <LinkButton to="/" look="main" icon="home">
          Go to the start
        </LinkButton>
      </Page>
    );
  }
  const retry = () => (failure.isMissingPart ? window.location.reload() : void revalidator.revalidate());
  return (
    <Page title="Something failed">
      <PageHeader title={`${area} could not be shown`} />
      <ErrorState
        title={describeFailure(failure)}
        onRetry={retry}
        isRetrying={revalidator.state === "loading"}
        requestId={failure.requestId}
        actions={
          <LinkButton to="/" icon="home">
            Go to the start
          </LinkButton>
        }
      >
        <p>Nothing you saved is lost. Try again; if you are offline, wait until the network is back.</p>
      </ErrorState>
    </Page>
  );
}
