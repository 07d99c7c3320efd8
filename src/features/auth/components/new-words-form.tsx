import { useQuery } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import type { Session } from "../../../../shared/contracts/auth.ts";
import { Button } from "../../../components/button.tsx";
import { TextField } from "../../../components/text-field.tsx";
import { findFieldError } from "../../../lib/field-error.ts";
import { passphrasesQuery, useRedeemReset } from "../api.ts";
import { FourWordsField } from "./four-words-field.tsx";
import { SignInProblem } from "./sign-in-problem.tsx";

export interface NewWordsFormProps {
  onSignedIn: (session: Session) => void;
}

/** A one-time code from the teacher, and new words to choose. The teacher never learns the words. */
export function NewWordsForm({ onSignedIn }: NewWordsFormProps) {
  const [fields, setFields] = useState({ classCode: "", username: "", code: "", passphrase: "" });
  const suggestions = useQuery(passphrasesQuery);
  const redeem = useRedeemReset();
  const set = (name: keyof typeof fields) => (value: string) => setFields((before) => ({ ...before, [name]: value }));

  const handleSubmit = (event: FormEvent) => {
    event.preventDefault();
    redeem.mutate(fields, { onSuccess: onSignedIn });
  };

  return (
    <form onSubmit={handleSubmit} className="space-y-5" noValidate>
      <SignInProblem
        error={redeem.error}
        wrongHint="Check the class code, your username and the code from your teacher. A code works once, for an hour."
      />
      <div className="grid grid-cols-2 gap-4 max-wide:grid-cols-1">
        <TextField
          name="classCode"
          label="Class code"
          isMono
          value={fields.classCode}
          onChange={(event) => set("classCode")(event.target.value)}
          autoCapitalize="characters"
          spellCheck={false}
          error={findFieldError(redeem.error, "/classCode")}
        />
        <TextField
          name="username"
          label="Username"
          value={fields.username}
          onChange={(event) => set("username")(event.target.value)}
          autoComplete="username"
          autoCapitalize="none"
          spellCheck={false}
          error={findFieldError(redeem.error, "/username")}
        />
      </div>
      <TextField
        name="code"
        label="Code from your teacher"
        hint="8 letters and numbers, like K7P2-M9QX"
        isMono
        value={fields.code}
        onChange={(event) => set("code")(event.target.value)}
        autoComplete="one-time-code"
        autoCapitalize="characters"
        spellCheck={false}
        error={findFieldError(redeem.error, "/code")}
      />
      <div>
        <FourWordsField
          name="passphrase"
          label="Your new four words"
          autoComplete="new-password"
          value={fields.passphrase}
          onChange={set("passphrase")}
          error={findFieldError(redeem.error, "/passphrase")}
        />
        {suggestions.data && (
          <div className="mt-3">
            <p className="text-meta text-slate">Take one of these, or make up four words of your own:</p>
            <ul className="mt-1.5 flex flex-wrap gap-2">
              {suggestions.data.map((words) => (
                <li key={words}>
                  <Button size="small" onPress={() => set("passphrase")(words.replaceAll("-", " "))}>
                    {words.replaceAll("-", " ")}
                  </Button>
                </li>
              ))}
            </ul>
          </div>
        )}
      </div>
      <Button
        type="submit"
        look="main"
        iconEnd="arrow-right"
        isPending={redeem.isPending}
        className="w-full justify-center"
      >
        Use these words
      </Button>
    </form>
  );
}
