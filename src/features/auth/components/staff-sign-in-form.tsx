import { useState, type FormEvent } from "react";
import type { Session } from "../../../../shared/contracts/auth.ts";
import { Button } from "../../../components/button.tsx";
import { TextField } from "../../../components/text-field.tsx";
import { findFieldError } from "../../../lib/field-error.ts";
import { useStaffSignIn } from "../api.ts";
import { SignInProblem } from "./sign-in-problem.tsx";

export interface StaffSignInFormProps {
  onSignedIn: (session: Session) => void;
}

/** E-mail and password of teachers, the coordinator and the admin. */
export function StaffSignInForm({ onSignedIn }: StaffSignInFormProps) {
  const [email, setEmail] = useState("");
  const [password, setPassword] = useState("");
  const signIn = useStaffSignIn();

  const handleSubmit = (event: FormEvent) => {
    event.preventDefault();
    signIn.mutate({ email: email.trim(), password }, { onSuccess: onSignedIn });
  };

  return (
    <form onSubmit={handleSubmit} className="space-y-5" noValidate>
      <SignInProblem error={signIn.error} wrongHint="Check the e-mail address and the password, then try again." />
      <TextField
        name="email"
        type="email"
        label="E-mail address"
        value={email}
        onChange={(event) => setEmail(event.target.value)}
        autoComplete="username"
        spellCheck={false}
        error={findFieldError(signIn.error, "/email")}
      />
      <TextField
        name="password"
        type="password"
        label="Password"
        value={password}
        onChange={(event) => setPassword(event.target.value)}
        autoComplete="current-password"
        error={findFieldError(signIn.error, "/password")}
      />
      <Button
        type="submit"
        look="main"
        iconEnd="arrow-right"
        isPending={signIn.isPending}
        className="w-full justify-center"
      >
        Sign in
      </Button>
    </form>
  );
}
