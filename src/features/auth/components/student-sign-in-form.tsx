import { useState, type FormEvent } from "react";
import type { Session } from "../../../../shared/contracts/auth.ts";
import { Button } from "../../../components/button.tsx";
import { TextField } from "../../../components/text-field.tsx";
import { findFieldError } from "../../../lib/field-error.ts";
import { useStudentSignIn } from "../api.ts";
import { FourWordsField } from "./four-words-field.tsx";
import { SignInProblem } from "./sign-in-problem.tsx";

const CLASS_CODE_KEY = "duskbell.class-code";

export interface StudentSignInFormProps {
  onSignedIn: (session: Session) => void;
  /** Known already when somebody signs in again. */
  username?: string;
}

/** Class code, username, four words. The class code is kept on this computer: it is no secret and the next pupil needs it too. */
export function StudentSignInForm({ onSignedIn, username: knownUsername = "" }: StudentSignInFormProps) {
  const [classCode, setClassCode] = useState(() => localStorage.getItem(CLASS_CODE_KEY) ?? "");
  const [username, setUsername] = useState(knownUsername);
  const [passphrase, setPassphrase] = useState("");
  const signIn = useStudentSignIn();

  const handleSubmit = (event: FormEvent) => {
    event.preventDefault();
    signIn.mutate(
      { classCode, username, passphrase },
      {
        onSuccess: (session) => {
          localStorage.setItem(CLASS_CODE_KEY, classCode.trim().toUpperCase());
          onSignedIn(session);
        },
      },
    );
  };

  return (
    <form onSubmit={handleSubmit} className="space-y-5" noValidate>
      <SignInProblem
        error={signIn.error}
        wrongHint="Look at your card again. Big and small letters do not count. If the words are lost, your teacher can help."
      />
      <div className="grid grid-cols-2 gap-4 max-wide:grid-cols-1">
        <TextField
          name="classCode"
          label="Class code"
          isMono
          value={classCode}
          onChange={(event) => setClassCode(event.target.value)}
          autoComplete="organization"
          autoCapitalize="characters"
          spellCheck={false}
          error={findFieldError(signIn.error, "/classCode")}
        />
        <TextField
          name="username"
          label="Username"
          value={username}
          onChange={(event) => setUsername(event.target.value)}
          autoComplete="username"
          autoCapitalize="none"
          spellCheck={false}
          error={findFieldError(signIn.error, "/username")}
        />
      </div>
      <FourWordsField
        name="passphrase"
        value={passphrase}
        onChange={setPassphrase}
        error={findFieldError(signIn.error, "/passphrase")}
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
