import { render, screen } from "@testing-library/react";
import { userEvent } from "@testing-library/user-event";
import { useState } from "react";
import { describe, expect, it } from "vitest";
import { Button } from "./button.tsx";
import { ErrorSummary } from "./error-summary.tsx";
import { TextField } from "./text-field.tsx";

function DueDateForm() {
  const [attempt, setAttempt] = useState(0);
  const message = attempt > 0 ? "Choose a day after today." : null;
  return (
    <form
      onSubmit={(event) => {
        event.preventDefault();
        setAttempt(attempt + 1);
      }}
    >
      <ErrorSummary attempt={attempt} errors={message ? [{ fieldId: "due", message: `Due date: ${message}` }] : []} />
      <TextField id="due" label="Due date" hint="Local time of the school." error={message} />
      <Button type="submit">Save</Button>
    </form>
  );
}

describe("TextField", () => {
  it("is found by its label and described by its hint", () => {
    render(<TextField label="Class code" hint="On your card." />);
    const field = screen.getByRole("textbox", { name: "Class code", description: "On your card." });
    expect(field.getAttribute("aria-invalid")).toBeNull();
  });

  it("with an error is invalid and described by the error before the hint", () => {
    render(<TextField label="Class code" hint="On your card." error="Write the code of your class." />);
    const field = screen.getByRole("textbox", {
      name: "Class code",
      description: "Write the code of your class. On your card.",
    });
    expect(field.getAttribute("aria-invalid")).toBe("true");
  });
});

describe("ErrorSummary", () => {
  it("is not there while nothing is wrong, takes the focus at a failed attempt and leads to the field", async () => {
    render(<DueDateForm />);
    expect(screen.queryByRole("alert")).toBeNull();
    await userEvent.click(screen.getByRole("button", { name: "Save" }));
    expect(document.activeElement).toBe(screen.getByRole("heading", { name: "One thing to mend" }));
    await userEvent.click(screen.getByRole("link", { name: "Due date: Choose a day after today." }));
    expect(document.activeElement).toBe(screen.getByRole("textbox", { name: "Due date" }));
  });
});
