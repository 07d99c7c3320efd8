import { useState } from "react";
import { Button } from "../../components/button.tsx";
import { Checkbox } from "../../components/checkbox.tsx";
import { ConfirmDialog } from "../../components/confirm-dialog.tsx";
import { Dialog } from "../../components/dialog.tsx";
import { ErrorSummary } from "../../components/error-summary.tsx";
import { IconButton } from "../../components/icon-button.tsx";
import { ProgressSteps } from "../../components/progress-steps.tsx";
import { RadioRow } from "../../components/radio-row.tsx";
import { Select } from "../../components/select.tsx";
import { TextArea } from "../../components/text-area.tsx";
import { TextField } from "../../components/text-field.tsx";
import { GallerySection } from "./gallery-section.tsx";

const LEVELS = [
  { value: "0", label: "not yet" },
  { value: "1", label: "nearly" },
  { value: "2", label: "yes" },
  { value: "3", label: "and more" },
];

/** Form fields and dialogs. */
export function Fields() {
  const [level, setLevel] = useState<string | null>("2");
  const [open, setOpen] = useState<"dialog" | "confirm" | null>(null);
  const close = () => setOpen(null);
  return (
    <>
      <GallerySection title="Fields">
        <div className="grid max-w-[44rem] grid-cols-2 gap-4 max-wide:grid-cols-1">
          <TextField label="Class code" isMono defaultValue="TARN-7B" />
          <TextField label="User name" defaultValue="wren" autoComplete="username" />
          <div>
            <TextField
              label="Your four words"
              defaultValue="kettle river owl"
              end={<IconButton icon="eye" label="Show the words" isPressed />}
              hint="Each word fills one bar."
            />
            <ProgressSteps total={4} done={3} isWide ground="paper" label="3 of 4 words typed" className="mt-2" />
          </div>
          <Select
            label="Song"
            placeholder="Choose a song"
            options={[
              { value: "bells", label: "Quillhaven Bells" },
              { value: "waltz", label: "Tea Room Waltz" },
            ]}
          />
          <TextField
            label="Due date"
            type="date"
            error="Choose a day after today."
            id="gallery-due"
            defaultValue="2026-11-20"
          />
          <TextField label="Room" isOptional placeholder="Room 12" />
          <TextArea
            label="To Wren and Idris"
            defaultValue="The foxes really run. For the next pass: what wakes them in bars 1 to 4?"
            className="col-span-full"
          />
          <div className="space-y-2">
            <Checkbox label="Gentle preview" defaultChecked hint="Softens quick changes of brightness." />
            <Checkbox label="Show my name on the programme" />
            <Checkbox label="Locked by your school" disabled defaultChecked />
          </div>
          <RadioRow
            legend="Fits the song"
            legendEnd={level ? `${Number(level) + 1} of 4` : "not chosen"}
            options={LEVELS}
            value={level}
            onChange={setLevel}
          />
        </div>
        <ErrorSummary
          attempt={0}
          errors={[{ fieldId: "gallery-due", message: "Due date: choose a day after today." }]}
        />
      </GallerySection>
      <GallerySection title="Dialogs">
        <div className="flex flex-wrap gap-2">
          <Button onPress={() => setOpen("dialog")}>Open a dialog</Button>
          <Button onPress={() => setOpen("confirm")}>Ask before deleting</Button>
        </div>
        <Dialog
          isOpen={open === "dialog"}
          onClose={close}
          title="New show"
          actions={
            <>
              <Button onPress={close}>Cancel</Button>
              <Button look="main" onPress={close}>
                Begin
              </Button>
            </>
          }
        >
          <TextField label="Title" hint="Up to 40 characters; the town reads it." />
        </Dialog>
        <ConfirmDialog
          isOpen={open === "confirm"}
          title="Delete Nine Foxes?"
          confirmLabel="Delete the show"
          cancelLabel="Keep it"
          onConfirm={close}
          onCancel={close}
        >
          <p>The script and its 3 versions go. This cannot be undone.</p>
        </ConfirmDialog>
      </GallerySection>
    </>
  );
}
