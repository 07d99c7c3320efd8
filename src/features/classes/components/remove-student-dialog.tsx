import type { ClassSummary, StudentRow } from "../../../../shared/contracts/classes.ts";
import { ConfirmDialog } from "../../../components/confirm-dialog.tsx";
import { showToast } from "../../../components/toast-queue.ts";
import { useRemoveStudent } from "../api.ts";

export interface RemoveStudentDialogProps {
  classSummary: ClassSummary;
  student: StudentRow;
  onClose: () => void;
}

export function RemoveStudentDialog({ classSummary, student, onClose }: RemoveStudentDialogProps) {
  const remove = useRemoveStudent(classSummary.id);
  return (
    <ConfirmDialog
      isOpen
      title={`Take ${student.displayName} out of ${classSummary.name}?`}
      confirmLabel="Take out of the class"
      cancelLabel={`Keep ${student.displayName}`}
      isPending={remove.isPending}
      error={remove.error?.message ?? null}
      onConfirm={() =>
        remove.mutate(student.id, {
          onSuccess: () => {
            showToast({
              title: `${student.displayName} is no longer in ${classSummary.name}.`,
              detail: "The work that was handed in stays.",
            });
            onClose();
          },
        })
      }
      onCancel={onClose}
    >
      <p>
        {student.displayName} can no longer sign in with the code of {classSummary.name}. What was handed in stays in
        the marking and on the square. This can not be undone here; the admin can help.
      </p>
    </ConfirmDialog>
  );
}
