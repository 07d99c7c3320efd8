import { render, screen } from "@testing-library/react";
import { userEvent } from "@testing-library/user-event";
import { describe, expect, it, vi } from "vitest";
import { Button } from "./button.tsx";

describe("Button", () => {
  it("acts on click, Enter and Space", async () => {
    const onPress = vi.fn();
    render(<Button onPress={onPress}>Run</Button>);
    const button = screen.getByRole("button", { name: "Run" });
    await userEvent.click(button);
    button.focus();
    await userEvent.keyboard("{Enter} ");
    expect(onPress).toHaveBeenCalledTimes(3);
  });

  it("with a reason stays in the tab order, says the reason and does nothing", async () => {
    const onPress = vi.fn();
    render(
      <Button onPress={onPress} disabledReason="Run the script once.">
        Change
      </Button>,
    );
    const button = screen.getByRole("button", { name: "Change", description: "Run the script once." });
    await userEvent.tab();
    expect(document.activeElement).toBe(button);
    await userEvent.click(button);
    await userEvent.keyboard("{Enter}");
    expect(button.getAttribute("aria-disabled")).toBe("true");
    expect(onPress).not.toHaveBeenCalled();
  });

  it("with a reason does not send its form", async () => {
    const onSubmit = vi.fn((event: SubmitEvent) => event.preventDefault());
    render(
      <form onSubmit={(event) => onSubmit(event.nativeEvent)}>
        <Button type="submit" disabledReason="Choose a song first.">
          Hand in
        </Button>
      </form>,
    );
    await userEvent.click(screen.getByRole("button", { name: "Hand in" }));
    expect(onSubmit).not.toHaveBeenCalled();
  });

  it("points at a reason that stands elsewhere and shows no second one", () => {
    render(
      <>
        <p id="why">The due date is missing.</p>
        <Button reasonId="why">Publish</Button>
      </>,
    );
    expect(
      screen
        .getByRole("button", { name: "Publish", description: "The due date is missing." })
        .getAttribute("aria-disabled"),
    ).toBe("true");
    expect(screen.getAllByText("The due date is missing.")).toHaveLength(1);
  });

  it("while pending is not pressed again", async () => {
    const onPress = vi.fn();
    render(
      <Button isPending onPress={onPress}>
        Handing in
      </Button>,
    );
    await userEvent.click(screen.getByRole("button", { name: /Handing in/ }));
    expect(onPress).not.toHaveBeenCalled();
  });
});
