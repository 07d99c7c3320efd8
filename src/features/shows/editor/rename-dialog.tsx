import { useState, type FormEvent } from "react";
import { Button } from "../../../components/button.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { TextField } from "../../../components/text-field.tsx";
import type { AskName } from "./language-keys.ts";

type Request = Parameters<AskName>[0];

/** `askName` for an editor, and the dialog that asks; put it on the page. */
export function useAskName(): { askName: AskName; dialog: React.ReactNode } {
  const [open, setOpen] = useState<{ request: Request; answer: (name: string | null) => void } | null>(null);
  const askName: AskName = (request) =>
    new Promise((resolve) => {
      setOpen({
        request,
        answer: (name) => {
          setOpen(null);
          resolve(name);
        },
      });
    });
  return { askName, dialog: open && <RenameDialog {...open} /> };
}

function RenameDialog({ request, answer }: { request: Request; answer: (name: string | null) => void }) {
  const [name, setName] = useState(request.name);
  const [fault, setFault] = useState<string | null>(null);
  const handleSubmit = async (event: FormEvent) => {
    event.preventDefault();
    const wanted = name.trim();
    const found = wanted === request.name ? null : await request.findFault(wanted);
    if (found === null) answer(wanted);
    else setFault(found);
  };
  return (
    <Dialog
      isOpen
      onClose={() => answer(null)}
      size="small"
      title={`Another name for ${request.name}`}
      actions={
        <>
          <Button onPress={() => answer(null)}>Keep {request.name}</Button>
          <Button look="main" type="submit" form="rename-in-script">
            Rename everywhere
          </Button>
        </>
      }
    >
      <form id="rename-in-script" onSubmit={(event) => void handleSubmit(event)} noValidate>
        <TextField
          label="New name"
          autoFocus
          autoComplete="off"
          spellCheck={false}
          value={name}
          onChange={(event) => {
            setName(event.target.value);
            setFault(null);
          }}
          error={fault}
        />
      </form>
    </Dialog>
  );
}
