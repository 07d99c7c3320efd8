import { CodeText } from "./lesson-text.tsx";

/** The plan of the lesson and what to watch for; only teachers get it from the server. */
export function TeacherNotes({ notes }: { notes: readonly string[] }) {
  return (
    <details className="rounded-sheet border border-line bg-card px-4 py-3">
      <summary className="cursor-pointer font-semibold">Notes for the teacher</summary>
      <ul className="mt-2 list-disc space-y-2 pl-5">
        {notes.map((note) => (
          <li key={note}>
            <CodeText text={note} />
          </li>
        ))}
      </ul>
    </details>
  );
}
