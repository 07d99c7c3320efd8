import { useState } from "react";
import type { ClassSummary, StudentRow } from "../../../../shared/contracts/classes.ts";
import type { ClassId } from "../../../../shared/ids.ts";
import { Button } from "../../../components/button.tsx";
import { EmptyState } from "../../../components/empty-state.tsx";
import { Menu } from "../../../components/menu.tsx";
import { presentWhen } from "../../../lib/zoned-time.ts";
import { AddStudentsDialog } from "./add-students-dialog.tsx";
import { LessonRail } from "./lesson-rail.tsx";
import { RemoveStudentDialog } from "./remove-student-dialog.tsx";
import { ResetCodeDialog } from "./reset-code-dialog.tsx";

export interface StudentTableProps {
  classSummary: ClassSummary;
  students: readonly StudentRow[];
  lessons: readonly { id: string; number: number; title: string }[];
  timeZone: string;
  now: number;
  /** New cards are on their page then. */
  onCardsMade: () => void;
}

type Task = { kind: "add" } | { kind: "reset" | "remove"; student: StudentRow };

/** The students of a class: progress in the lessons, last seen, and what can be done for one. */
export function StudentTable({ classSummary, students, lessons, timeZone, now, onCardsMade }: StudentTableProps) {
  const [task, setTask] = useState<Task | null>(null);
  const classId: ClassId = classSummary.id;
  const close = () => setTask(null);
  return (
    <>
      <div className="mb-3 flex flex-wrap items-center gap-3">
        <h2>{students.length === 1 ? "1 student" : `${students.length} students`}</h2>
        <Button
          className="ml-auto"
          icon="plus"
          look={students.length === 0 ? "main" : "plain"}
          onPress={() => setTask({ kind: "add" })}
        >
          Add students
        </Button>
      </div>
      {students.length === 0 ? (
        <EmptyState icon="people" title="Nobody is in this class yet">
          Paste the names of your class list, one a line. Every student gets a sign-in card to cut out; no e-mail
          address is needed.
        </EmptyState>
      ) : (
        <div className="relative overflow-x-auto rounded-sheet border border-line bg-card shadow-sheet-1">
          <table className="w-full border-collapse max-wide:block">
            <thead className="max-wide:sr-only">
              <tr className="border-b-[1.5px] border-line text-left text-meta text-slate [&>th]:px-4 [&>th]:py-2 [&>th]:font-semibold">
                <th scope="col">Name</th>
                <th scope="col">Username</th>
                <th scope="col">Lessons</th>
                <th scope="col" className="text-right">
                  Shows
                </th>
                <th scope="col">Last seen</th>
                <th scope="col">
                  <span className="sr-only">Acts</span>
                </th>
              </tr>
            </thead>
            <tbody className="divide-y divide-line max-wide:block">
              {students.map((student) => (
                <tr
                  key={student.id}
                  className="max-wide:relative max-wide:flex max-wide:flex-wrap max-wide:items-center max-wide:gap-x-4 max-wide:gap-y-1 max-wide:px-4 max-wide:py-3 wide:[&>*]:px-4 wide:[&>*]:py-1.5"
                >
                  <th scope="row" className="text-left font-[650] max-wide:w-full max-wide:pr-12">
                    {student.displayName}
                  </th>
                  <td className="font-mono text-meta">{student.username}</td>
                  <td>
                    <LessonRail lessons={lessons} progress={student.lessons} />
                  </td>
                  <td className="tabular-nums wide:text-right">
                    {student.showCount}
                    <span className="wide:sr-only">{student.showCount === 1 ? " show" : " shows"}</span>
                  </td>
                  <td className="whitespace-nowrap text-slate">
                    {student.lastSeenAt === null ? "never" : presentWhen(student.lastSeenAt, now, timeZone)}
                  </td>
                  <td className="text-right max-wide:absolute max-wide:top-2 max-wide:right-2">
                    <Menu
                      isIconOnly
                      icon="more"
                      size="small"
                      label={`Acts for ${student.displayName}`}
                      actions={[
                        {
                          id: "reset",
                          label: "One-time code for new words",
                          icon: "key",
                          onAction: () => setTask({ kind: "reset", student }),
                        },
                        {
                          id: "remove",
                          label: "Take out of the class",
                          icon: "trash",
                          tone: "stop",
                          onAction: () => setTask({ kind: "remove", student }),
                        },
                      ]}
                    />
                  </td>
                </tr>
              ))}
            </tbody>
          </table>
        </div>
      )}
      {task?.kind === "add" && (
        <AddStudentsDialog
          classId={classId}
          known={students.map((student) => student.displayName)}
          onClose={close}
          onAdded={() => {
            close();
            onCardsMade();
          }}
        />
      )}
      {task?.kind === "reset" && (
        <ResetCodeDialog classId={classId} student={task.student} timeZone={timeZone} now={now} onClose={close} />
      )}
      {task?.kind === "remove" && (
        <RemoveStudentDialog classSummary={classSummary} student={task.student} onClose={close} />
      )}
    </>
  );
}
