import type { ReactNode } from "react";
import { Button } from "./button.tsx";
import { Dialog } from "./dialog.tsx";
import { Notice } from "./notice.tsx";

export interface ConfirmDialogProps {
  isOpen: boolean;
  /** The question, with the thing's name: "Delete Nine Foxes?" */
  title: ReactNode;
  /** What will happen, and whether it can be undone. */
  children: ReactNode;
  /** The act in words: "Delete the show", never "OK". */
  confirmLabel: string;
  /** The way back in words: "Keep it". */
  cancelLabel?: string;
  /** stop: it destroys something. main: it only matters. */
  tone?: "stop" | "main";
  onConfirm: () => void;
  onCancel: () => void;
  isPending?: boolean;
  /** Why the act failed; the dialog stays open and says so. */
  error?: string | null;
}

/** Asks before what cannot be undone. The way back has the focus first, so that a hasty Enter harms nothing. */
export function ConfirmDialog({
  isOpen,
  title,
  children,
  confirmLabel,
  cancelLabel = "Cancel",
  tone = "stop",
  onConfirm,
  onCancel,
  isPending = false,
  error,
}: ConfirmDialogProps) {
  return (
    <Dialog
      isOpen={isOpen}
      onClose={onCancel}
      title={title}
      role="alertdialog"
      size="small"
      isBusy={isPending}
      actions={
        <>
          <Button autoFocus onPress={onCancel} disabledReason={isPending ? "Wait until it is done." : null}>
            {cancelLabel}
          </Button>
          <Button look={tone} onPress={onConfirm} isPending={isPending}>
            {confirmLabel}
          </Button>
        </>
      }
    >
      {children}
      {error && <Notice tone="stop" role="alert" title={error} />}
    </Dialog>
  );
}
