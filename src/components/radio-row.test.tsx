import { render, screen } from "@testing-library/react";
import { userEvent } from "@testing-library/user-event";
import { useState } from "react";
import { describe, expect, it } from "vitest";
import { RadioRow } from "./radio-row.tsx";

function Criterion() {
  const [level, setLevel] = useState<"none" | "some" | "all" | null>(null);
  return (
    <RadioRow
      legend="Fits the song"
      options={[
        { value: "none", label: "not yet" },
        { value: "some", label: "nearly" },
        { value: "all", label: "yes" },
      ]}
      value={level}
      onChange={setLevel}
    />
  );
}

const isChosen = (name: string) => screen.getByRole<HTMLInputElement>("radio", { name }).checked;

describe("RadioRow", () => {
  it("has nothing chosen until somebody chooses", async () => {
    render(<Criterion />);
    expect(screen.getByRole("group", { name: "Fits the song" })).toBeTruthy();
    expect(["not yet", "nearly", "yes"].map(isChosen)).toEqual([false, false, false]);
    await userEvent.click(screen.getByRole("radio", { name: "nearly" }));
    expect(["not yet", "nearly", "yes"].map(isChosen)).toEqual([false, true, false]);
  });

  it("moves the choice with the arrow keys", async () => {
    render(<Criterion />);
    await userEvent.click(screen.getByRole("radio", { name: "not yet" }));
    await userEvent.keyboard("{ArrowRight}{ArrowRight}");
    expect(isChosen("yes")).toBe(true);
  });
});
