import { render, screen } from "@testing-library/react";
import { userEvent } from "@testing-library/user-event";
import { useState } from "react";
import { describe, expect, it, vi } from "vitest";
import { Button } from "./button.tsx";
import { ConfirmDialog } from "./confirm-dialog.tsx";
import { Dialog } from "./dialog.tsx";
import { TextField } from "./text-field.tsx";

function NewShow() {
  const [isOpen, setIsOpen] = useState(false);
  return (
    <>
      <Button onPress={() => setIsOpen(true)}>New show</Button>
      <Dialog isOpen={isOpen} onClose={() => setIsOpen(false)} title="New show">
        <TextField label="Title" />
      </Dialog>
    </>
  );
}

describe("Dialog", () => {
  it("opens with its title, keeps the focus inside and gives it back on Escape", async () => {
    render(<NewShow />);
    const opener = screen.getByRole("button", { name: "New show" });
    await userEvent.click(opener);
    const dialog = screen.getByRole("dialog", { name: "New show" });
    for (let stop = 0; stop < 4; stop++) {
      await userEvent.tab();
      expect(dialog.contains(document.activeElement)).toBe(true);
    }
    await userEvent.keyboard("{Escape}");
    expect(screen.queryByRole("dialog")).toBeNull();
    await vi.waitFor(() => expect(document.activeElement).toBe(opener));
  });

  it("closes by its cross", async () => {
    render(<NewShow />);
    await userEvent.click(screen.getByRole("button", { name: "New show" }));
    await userEvent.click(screen.getByRole("button", { name: "Close" }));
    expect(screen.queryByRole("dialog")).toBeNull();
  });
});

function renderQuestion(extra: { isPending?: boolean; error?: string } = {}) {
  const onConfirm = vi.fn();
  const onCancel = vi.fn();
  render(
    <ConfirmDialog
      isOpen
      title="Delete Nine Foxes?"
      confirmLabel="Delete the show"
      cancelLabel="Keep it"
      onConfirm={onConfirm}
      onCancel={onCancel}
      {...extra}
    >
      <p>This cannot be undone.</p>
    </ConfirmDialog>,
  );
  return { onConfirm, onCancel };
}

describe("ConfirmDialog", () => {
  it("has the focus on the way back, so that Enter harms nothing", async () => {
    const { onConfirm, onCancel } = renderQuestion();
    expect(screen.getByRole("alertdialog", { name: "Delete Nine Foxes?" })).toBeTruthy();
    expect(document.activeElement).toBe(screen.getByRole("button", { name: "Keep it" }));
    await userEvent.keyboard("{Enter}");
    expect(onCancel).toHaveBeenCalledTimes(1);
    expect(onConfirm).not.toHaveBeenCalled();
  });

  it("acts only by its own button", async () => {
    const { onConfirm, onCancel } = renderQuestion();
    await userEvent.click(screen.getByRole("button", { name: "Delete the show" }));
    expect(onConfirm).toHaveBeenCalledTimes(1);
    expect(onCancel).not.toHaveBeenCalled();
  });

  it("goes back on Escape", async () => {
    const { onCancel } = renderQuestion();
    await userEvent.keyboard("{Escape}");
    expect(onCancel).toHaveBeenCalledTimes(1);
  });

  it("while the act is under way neither closes nor acts again", async () => {
    const { onConfirm, onCancel } = renderQuestion({ isPending: true });
    await userEvent.keyboard("{Escape}");
    await userEvent.click(screen.getByRole("button", { name: "Keep it" }));
    await userEvent.click(screen.getByRole("button", { name: /Delete the show/ }));
    expect(onCancel).not.toHaveBeenCalled();
    expect(onConfirm).not.toHaveBeenCalled();
  });

  it("says why the act failed and stays open", () => {
    renderQuestion({ error: "The show is in tonight's lineup." });
    expect(screen.getByRole("alert").textContent).toContain("The show is in tonight's lineup.");
  });
});
