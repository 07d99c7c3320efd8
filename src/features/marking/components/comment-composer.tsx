import { useState, type KeyboardEvent } from "react";
import { Button } from "../../../components/button.tsx";
import { TextArea } from "../../../components/text-area.tsx";

export interface CommentComposerProps {
  /** "line 6", "bar 21". */
  place: string;
  /** Names the unsent text; what was typed comes back when the box is opened again there. */
  draftKey: string;
  isPending: boolean;
  error: string | null;
  onSave: (body: string) => void;
  onCancel: () => void;
}

const MAX_LENGTH = 2000;
/** Unsent comments of this visit: a closed box or another show must not lose them. */
const unsent = new Map<string, string>();

/** Forgets the unsent text of a place, once it is a comment. */
export function dropUnsentComment(draftKey: string): void {
  unsent.delete(draftKey);
}

/** The box to write a comment in, where it will stand. */
export function CommentComposer({ place, draftKey, isPending, error, onSave, onCancel }: CommentComposerProps) {
  const [body, setBody] = useState(unsent.get(draftKey) ?? "");
  const [isMissed, setIsMissed] = useState(false);
  const save = () => {
    setIsMissed(body.trim() === "");
    if (body.trim() !== "") onSave(body.trim());
  };
  const handleKey = (event: KeyboardEvent) => {
    if (event.key === "Escape") {
      event.stopPropagation();
      onCancel();
    }
    if (event.key === "Enter" && (event.ctrlKey || event.metaKey)) {
      event.preventDefault();
      save();
    }
  };
  return (
    <form
      className="rounded-r-cut border-l-[3px] border-blue-ink bg-blue-tint p-2.5 font-text text-body whitespace-normal"
      onSubmit={(event) => {
        event.preventDefault();
        save();
      }}
    >
      <TextArea
        label={`Comment on ${place}`}
        rows={2}
        autoFocus
        value={body}
        maxLength={MAX_LENGTH}
        onChange={(event) => {
          setBody(event.target.value);
          unsent.set(draftKey, event.target.value);
        }}
        onKeyDown={handleKey}
        error={error ?? (isMissed && body.trim() === "" ? "Write the comment first." : null)}
      />
      <div className="mt-2 flex flex-wrap gap-2">
        <Button type="submit" look="main" size="small" isPending={isPending}>
          Save comment
        </Button>
        <Button size="small" look="quiet" onPress={onCancel}>
          Cancel
        </Button>
      </div>
    </form>
  );
}
