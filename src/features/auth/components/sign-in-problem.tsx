import { ApiProblem } from "../../../lib/api-client.ts";
import { Notice } from "../../../components/notice.tsx";

export interface SignInProblemProps {
  error: Error | null;
  /** What to do when the words do not fit. */
  wrongHint: string;
}

/** Why the sign-in did not go through, and what to do about it. */
export function SignInProblem({ error, wrongHint }: SignInProblemProps) {
  if (error === null) return null;
  const slug = error instanceof ApiProblem ? error.slug : "unknown";
  if (slug === "wrong-sign-in") {
    return (
      <Notice tone="stop" role="alert" title="These do not fit together.">
        {wrongHint}
      </Notice>
    );
  }
  if (slug === "slow-down") {
    return (
      <Notice tone="warn" role="alert" title="Please wait a little.">
        {error.message}
      </Notice>
    );
  }
  if (slug === "offline") {
    return (
      <Notice tone="warn" role="alert" title="The server can not be reached.">
        Check the network, then try again. What you typed stays here.
      </Notice>
    );
  }
  return (
    <Notice tone="stop" role="alert" title={error.message}>
      {error instanceof ApiProblem && error.requestId !== null && (
        <>If it happens again, tell your teacher this number: {error.requestId}</>
      )}
    </Notice>
  );
}
