import { useState, type FormEvent } from "react";
import type { ShowSummary } from "../../../../shared/contracts/shows.ts";
import { Button } from "../../../components/button.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { Menu } from "../../../components/menu.tsx";
import { TextField } from "../../../components/text-field.tsx";
import { showToast } from "../../../components/toast-queue.ts";
import { PartnersDialog } from "./partners-dialog.tsx";
import { useDuplicateShow, useUpdateShow } from "../api.ts";

/** Rename, write together, copy, archive or bring back a show. Archiving is undone from its message. */
export function ShowMenu({ show }: { show: ShowSummary }) {
  const [open, setOpen] = useState<"rename" | "partners" | null>(null);
  const update = useUpdateShow();
  const duplicate = useDuplicateShow();
  const fail = (title: string) => (error: Error) => showToast({ tone: "stop", title, detail: error.message });

  const setArchived = (isArchived: boolean) =>
    update.mutate(
      { showId: show.id, isArchived },
      {
        onSuccess: () =>
          showToast({
            title: isArchived ? `${show.title} is archived.` : `${show.title} is back.`,
            action: { label: "Undo", onPress: () => setArchived(!isArchived) },
          }),
        onError: fail("The show could not be moved."),
      },
    );
  const handleDuplicate = () =>
    duplicate.mutate(show.id, {
      onSuccess: (made) =>
        showToast({ title: `${made.show.title} is made.`, detail: "It is a copy of the script as it is now." }),
      onError: fail("The show could not be copied."),
    });

  return (
    <>
      <Menu
        label={`More for ${show.title}`}
        isIconOnly
        size="small"
        actions={[
          { id: "rename", label: "Rename", icon: "pencil", onAction: () => setOpen("rename") },
          { id: "partners", label: "Write together", icon: "people", onAction: () => setOpen("partners") },
          { id: "copy", label: "Make a copy", icon: "copy", onAction: handleDuplicate },
          show.isArchived
            ? { id: "back", label: "Bring it back", icon: "undo", onAction: () => setArchived(false) }
            : { id: "archive", label: "Archive", icon: "box", onAction: () => setArchived(true) },
        ]}
      />
      {open === "rename" && <RenameDialog show={show} onClose={() => setOpen(null)} />}
      {open === "partners" && <PartnersDialog show={show} onClose={() => setOpen(null)} />}
    </>
  );
}

function RenameDialog({ show, onClose }: { show: ShowSummary; onClose: () => void }) {
  const [title, setTitle] = useState(show.title);
  const update = useUpdateShow();
  const handleSubmit = (event: FormEvent) => {
    event.preventDefault();
    update.mutate({ showId: show.id, title }, { onSuccess: onClose });
  };
  return (
    <Dialog
      isOpen
      onClose={onClose}
      size="small"
      title={`Rename ${show.title}`}
      isBusy={update.isPending}
      actions={
        <>
          <Button onPress={onClose}>Keep the name</Button>
          <Button look="main" type="submit" form="rename-show" isPending={update.isPending}>
            Rename
          </Button>
        </>
      }
    >
      <form id="rename-show" onSubmit={handleSubmit} noValidate>
        <TextField
          label="Title"
          name="title"
          autoFocus
          maxLength={60}
          value={title}
          onChange={(event) => setTitle(event.target.value)}
          error={update.error?.message ?? null}
        />
      </form>
    </Dialog>
  );
}
