import { useState } from "react";
import type { ClassId } from "../../../../shared/ids.ts";
import { Button } from "../../../components/button.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { Notice } from "../../../components/notice.tsx";
import { TextArea } from "../../../components/text-area.tsx";
import { useAddStudents } from "../api.ts";
import { MAX_NAMES, parseNameLines } from "../model/name-lines.ts";

export interface AddStudentsDialogProps {
  classId: ClassId;
  /** Names that are in the class already. */
  known: readonly string[];
  onAdded: () => void;
  onClose: () => void;
}

/** Paste names, one a line; every line that cannot be taken is named, and nothing is added until all can. */
export function AddStudentsDialog({ classId, known, onAdded, onClose }: AddStudentsDialogProps) {
  const [text, setText] = useState("");
  const [isTried, setIsTried] = useState(false);
  const addStudents = useAddStudents(classId);
  const { names, problems } = parseNameLines(text, known);
  const tooMany = names.length > MAX_NAMES;
  const error = !isTried
    ? null
    : problems.length > 0
      ? "Mend the lines named below, or take them out."
      : names.length === 0
        ? "Write at least one name."
        : tooMany
          ? `Add at most ${MAX_NAMES} at a time; these are ${names.length}.`
          : null;

  const handleAdd = () => {
    setIsTried(true);
    if (problems.length > 0 || names.length === 0 || tooMany) return;
    addStudents.mutate([...names], { onSuccess: onAdded });
  };

  return (
    <Dialog
      isOpen
      onClose={onClose}
      title="Add students"
      isBusy={addStudents.isPending}
      actions={
        <>
          <Button onPress={onClose}>Cancel</Button>
          <Button look="main" icon="plus" onPress={handleAdd} isPending={addStudents.isPending}>
            {names.length === 0
              ? "Add students"
              : names.length === 1
                ? "Add 1 student"
                : `Add ${names.length} students`}
          </Button>
        </>
      }
    >
      <TextArea
        label="Names, one a line"
        hint="First names, or what you call them in class: the others in the class see them. Numbers before a name are left out. Each student gets a username and a sign-in card."
        rows={8}
        autoFocus
        spellCheck={false}
        value={text}
        onChange={(event) => setText(event.target.value)}
        error={error}
      />
      {problems.length > 0 && (
        <Notice
          tone="warn"
          title={problems.length === 1 ? "1 line can not be taken" : `${problems.length} lines can not be taken`}
        >
          <ul>
            {problems.map((problem) => (
              <li key={problem.line}>
                Line {problem.line}: “{problem.text}” {problem.reason}.
              </li>
            ))}
          </ul>
        </Notice>
      )}
      {addStudents.error && (
        <Notice tone="stop" role="alert" title="The students were not added.">
          {addStudents.error.message} What you typed is still here.
        </Notice>
      )}
    </Dialog>
  );
}
