import { useState, type FormEvent } from "react";
import type { LoaderFunctionArgs } from "react-router";
import { PASSWORD_MIN_LENGTH } from "../../shared/contracts/auth.ts";
import { Button } from "../components/button.tsx";
import { Notice } from "../components/notice.tsx";
import { Page, PageHeader } from "../components/page.tsx";
import { TextField } from "../components/text-field.tsx";
import { useChangePassword } from "../features/auth/api.ts";
import { findFieldError } from "../lib/field-error.ts";
import { ApiProblem } from "../lib/api-client.ts";
import { requireSession } from "./guards.ts";

export async function loader({ request }: LoaderFunctionArgs) {
  await requireSession(request, "teacher", "coordinator", "admin");
  return null;
}

/** A staff member's own password. */
export function Component() {
  const [current, setCurrent] = useState("");
  const [next, setNext] = useState("");
  const change = useChangePassword();
  const isWrong = change.error instanceof ApiProblem && change.error.slug === "wrong-sign-in";
  const fields = { current: findFieldError(change.error, "/current"), next: findFieldError(change.error, "/next") };

  const handleSubmit = (event: FormEvent) => {
    event.preventDefault();
    change.mutate(
      { current, next },
      {
        onSuccess: () => {
          setCurrent("");
          setNext("");
        },
      },
    );
  };

  return (
    <Page title="Your account" density="staff" className="mx-auto max-w-page">
      <PageHeader title="Change your password" lead="Every other place where you are signed in is signed out." />
      <form onSubmit={handleSubmit} noValidate className="max-w-md space-y-4">
        {change.isSuccess && <Notice tone="ok" role="status" title="Your password is changed." />}
        {change.error && !isWrong && !fields.current && !fields.next && (
          <Notice tone="stop" role="alert" title={change.error.message} />
        )}
        <TextField
          name="current"
          label="The password you have now"
          type="password"
          autoComplete="current-password"
          value={current}
          onChange={(event) => setCurrent(event.target.value)}
          error={isWrong ? "This is not your password now." : fields.current}
        />
        <TextField
          name="next"
          label="New password"
          type="password"
          autoComplete="new-password"
          hint={`${PASSWORD_MIN_LENGTH} characters or more. A sentence that only you would say works well.`}
          value={next}
          onChange={(event) => setNext(event.target.value)}
          error={fields.next}
        />
        <Button type="submit" look="main" isPending={change.isPending}>
          Change the password
        </Button>
      </form>
    </Page>
  );
}
