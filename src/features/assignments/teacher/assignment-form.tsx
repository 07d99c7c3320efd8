import { useState, type FormEvent } from "react";
import type { AssignmentFields } from "../../../../shared/contracts/assignments.ts";
import type { SongSummary } from "../../../../shared/contracts/songs.ts";
import { Button } from "../../../components/button.tsx";
import { ErrorSummary } from "../../../components/error-summary.tsx";
import { LinkButton } from "../../../components/link-button.tsx";
import { Notice } from "../../../components/notice.tsx";
import { RadioRow } from "../../../components/radio-row.tsx";
import { Select } from "../../../components/select.tsx";
import { TextArea } from "../../../components/text-area.tsx";
import { TextField } from "../../../components/text-field.tsx";
import { UnsavedGuard } from "../../../components/unsaved-guard.tsx";
import { ApiProblem } from "../../../lib/api-client.ts";
import { presentDue, presentLength } from "../../../lib/zoned-time.ts";
import {
  type AssignmentDraft,
  checkDraft,
  type CheckOptions,
  type DraftError,
  presentField,
  toFieldId,
} from "./assignment-form-model.ts";
import { RubricEditor } from "./rubric-editor.tsx";
import { UsesEditor } from "./uses-editor.tsx";

export interface AssignmentFormProps {
  start: AssignmentDraft;
  check: CheckOptions;
  songs: readonly Pick<SongSummary, "id" | "title" | "seconds">[];
  saveLabel: string;
  backTo: string;
  /** Something was marked with the rubric: it stays as it is. */
  isRubricFixed: boolean;
  /** Shows were begun with the song. */
  isSongFixed: boolean;
  isPending: boolean;
  isSaved: boolean;
  error: Error | null;
  onSave: (fields: AssignmentFields) => void;
}

/** Everything that an assignment is made of, checked as a whole: every bad field is named, nothing typed is lost. */
export function AssignmentForm({
  start,
  check,
  songs,
  saveLabel,
  backTo,
  isRubricFixed,
  isSongFixed,
  isPending,
  isSaved,
  error,
  onSave,
}: AssignmentFormProps) {
  const [draft, setDraft] = useState(start);
  const [attempt, setAttempt] = useState(0);
  const set = (change: Partial<AssignmentDraft>) => setDraft((before) => ({ ...before, ...change }));

  const checked = checkDraft(draft, check);
  const errors = attempt === 0 ? [] : [...(checked.errors ?? []), ...(checked.errors ? [] : toServerErrors(error))];
  const errorOf = (fieldId: string) => errors.find((found) => found.fieldId === fieldId)?.message ?? null;
  const isDirty = JSON.stringify(draft) !== JSON.stringify(start) && !isSaved;

  const handleSubmit = (event: FormEvent) => {
    event.preventDefault();
    setAttempt((count) => count + 1);
    if (checked.fields) onSave(checked.fields);
  };

  return (
    <form onSubmit={handleSubmit} noValidate className="max-w-[60rem] space-y-6">
      <UnsavedGuard isDirty={isDirty} what="What you wrote for this assignment is not saved." />
      <ErrorSummary
        errors={errors.map((found) => ({
          fieldId: found.fieldId,
          message: `${presentField(found.fieldId)}: ${found.message}`,
        }))}
        attempt={attempt}
      />
      {error && toServerErrors(error).length === 0 && (
        <Notice tone="stop" role="alert" title="The assignment was not saved.">
          {error.message} What you wrote is still here.
        </Notice>
      )}
      <TextField
        id="title"
        label="Title"
        value={draft.title}
        maxLength={80}
        onChange={(event) => set({ title: event.target.value })}
        error={errorOf("title")}
      />
      <Select
        id="songId"
        label="Song"
        placeholder="Choose a song"
        value={draft.songId}
        disabled={isSongFixed}
        hint={isSongFixed ? "Shows were begun with this song, so it stays." : undefined}
        onChange={(event) => set({ songId: event.target.value })}
        options={songs.map((song) => ({ value: song.id, label: `${song.title} (${presentLength(song.seconds)})` }))}
        error={errorOf("songId")}
      />
      <TextArea
        id="brief"
        label="Brief"
        hint="What to make, in words for the class. Leave an empty line between paragraphs."
        rows={6}
        value={draft.brief}
        maxLength={4000}
        onChange={(event) => set({ brief: event.target.value })}
        error={errorOf("brief")}
      />
      <div className="grid grid-cols-2 gap-6 max-wide:grid-cols-1">
        <DueField
          draft={draft}
          zone={check.zone}
          onChange={(due) => set({ due })}
          error={errorOf("due")}
          fields={checked.fields}
        />
        <RadioRow
          legend="After the due date"
          options={[
            { value: "accept-late", label: "Take it, marked late" },
            { value: "closed", label: "Take nothing more" },
          ]}
          value={draft.lateRule}
          onChange={(lateRule) => set({ lateRule })}
        />
      </div>
      <UsesEditor uses={draft.uses} onChange={(uses) => set({ uses })} />
      {isRubricFixed ? (
        <Notice title="The rubric stays as it is.">
          Something was marked with it. Set a new assignment for another rubric.
        </Notice>
      ) : (
        <RubricEditor rubric={draft.rubric} onChange={(rubric) => set({ rubric })} errorOf={errorOf} />
      )}
      <div className="sticky bottom-0 z-10 -mx-2 flex flex-wrap gap-2 border-t border-line bg-paper px-2 py-3">
        <Button type="submit" look="main" isPending={isPending}>
          {saveLabel}
        </Button>
        <LinkButton to={backTo}>Cancel</LinkButton>
        <p className="self-center text-meta text-slate">{isDirty ? "Not saved yet." : ""}</p>
      </div>
    </form>
  );
}

interface DueFieldProps {
  draft: AssignmentDraft;
  zone: string;
  onChange: (due: string) => void;
  error: string | null;
  fields: AssignmentFields | null;
}

function DueField({ draft, zone, onChange, error, fields }: DueFieldProps) {
  const place = zone.split("/").at(-1)?.replaceAll("_", " ");
  return (
    <TextField
      id="due"
      type="datetime-local"
      label="Due"
      value={draft.due}
      onChange={(event) => onChange(event.target.value)}
      hint={
        fields
          ? `${presentDue(fields.dueAt, zone)}, by the school's clock (${place} time).`
          : `By the school's clock (${place} time).`
      }
      error={error}
    />
  );
}

/** What the server found wrong, by field. */
function toServerErrors(error: Error | null): DraftError[] {
  if (!(error instanceof ApiProblem)) return [];
  return error.errors.map((field) => ({
    fieldId: toFieldId(field.pointer.split("/").slice(1)),
    message: field.detail,
  }));
}
