import { useState } from "react";
import type { StudentRow } from "../../../../shared/contracts/classes.ts";
import type { ClassId } from "../../../../shared/ids.ts";
import { Button } from "../../../components/button.tsx";
import { ConfirmDialog } from "../../../components/confirm-dialog.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { presentWhen } from "../../../lib/zoned-time.ts";
import { useResetSignIn } from "../api.ts";

export interface ResetCodeDialogProps {
  classId: ClassId;
  student: StudentRow;
  timeZone: string;
  now: number;
  onClose: () => void;
}

/** Asks first, since it ends the student's sessions; then shows the code, the only time that it can be read. */
export function ResetCodeDialog({ classId, student, timeZone, now, onClose }: ResetCodeDialogProps) {
  const reset = useResetSignIn(classId);
  const [isCopied, setIsCopied] = useState(false);
  const code = reset.data?.code;
  if (!reset.data || !code) {
    return (
      <ConfirmDialog
        isOpen
        title={`A one-time code for ${student.displayName}?`}
        tone="main"
        confirmLabel="Make the code"
        isPending={reset.isPending}
        error={reset.error?.message ?? null}
        onConfirm={() => reset.mutate(student.id)}
        onCancel={onClose}
      >
        <p>
          With it, {student.displayName} chooses four new words. The old words stop working and every open session of{" "}
          {student.displayName} ends. Scripts are kept.
        </p>
      </ConfirmDialog>
    );
  }
  const spaced = `${code.slice(0, 4)} ${code.slice(4)}`;
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={`Code for ${student.displayName}`}
      size="small"
      actions={
        <>
          <Button
            icon="copy"
            onPress={() => {
              void navigator.clipboard.writeText(code).then(() => setIsCopied(true));
            }}
          >
            {isCopied ? "Copied" : "Copy"}
          </Button>
          <Button look="main" onPress={onClose}>
            Done
          </Button>
        </>
      }
    >
      <p className="rounded-sheet border border-line bg-card py-4 text-center font-mono text-7 font-bold tracking-wider">
        {spaced}
      </p>
      <p>
        {student.displayName} opens the sign-in page, chooses “I have a code”, and types the class code, the username{" "}
        <code className="font-mono">{student.username}</code> and this code.
      </p>
      <p className="text-soft">
        It works once, until {presentWhen(reset.data.expiresAt, now, timeZone)}. It can not be shown again; make another
        if it gets lost.
      </p>
    </Dialog>
  );
}
