import { useQuery } from "@tanstack/react-query";
import { useState, type ReactNode } from "react";
import type { Partners } from "../../../../shared/contracts/partners.ts";
import type { ShowSummary } from "../../../../shared/contracts/shows.ts";
import { UserIdSchema } from "../../../../shared/ids.ts";
import { Button } from "../../../components/button.tsx";
import { ConfirmDialog } from "../../../components/confirm-dialog.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { Notice } from "../../../components/notice.tsx";
import { QueryView } from "../../../components/query-view.tsx";
import { Select } from "../../../components/select.tsx";
import { Skeleton, SkeletonGroup } from "../../../components/skeleton.tsx";
import { showToast } from "../../../components/toast-queue.ts";
import { partnersQuery, useAskPartner, useLeaveShow, useWithdrawPartner } from "../partners-api.ts";

export interface PartnersDialogProps {
  show: ShowSummary;
  onClose: () => void;
}

/** Who writes a show: ask a classmate, take the question back, leave. */
export function PartnersDialog({ show, onClose }: PartnersDialogProps) {
  const [isLeaving, setIsLeaving] = useState(false);
  const query = useQuery(partnersQuery(show.id));
  const leave = useLeaveShow(show.id);
  if (isLeaving)
    return (
      <ConfirmDialog
        isOpen
        title={`Leave ${show.title}?`}
        confirmLabel="Leave it"
        cancelLabel="Stay"
        isPending={leave.isPending}
        error={leave.error?.message ?? null}
        onCancel={() => setIsLeaving(false)}
        onConfirm={() =>
          leave.mutate(undefined, {
            onSuccess: () => {
              showToast({ title: `You left ${show.title}.`, detail: "A copy of the script is among your shows." });
              onClose();
            },
          })
        }
      >
        <p>The others go on without you. You keep a copy of the script. To come back, somebody has to ask you.</p>
      </ConfirmDialog>
    );
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title={`Write ${show.title} together`}
      actions={<Button onPress={onClose}>Close</Button>}
    >
      <QueryView
        query={query}
        errorTitle="The authors could not be loaded."
        skeleton={
          <SkeletonGroup label="Loading the authors" className="space-y-4">
            <Skeleton className="w-1/2" />
            <Skeleton className="w-2/3" />
          </SkeletonGroup>
        }
      >
        {(partners) => <PartnersForm show={show} partners={partners} onLeave={() => setIsLeaving(true)} />}
      </QueryView>
    </Dialog>
  );
}

function PartnersForm({ show, partners, onLeave }: { show: ShowSummary; partners: Partners; onLeave: () => void }) {
  const { authors, asked, classmates, obstacle } = partners;
  const [chosen, setChosen] = useState("");
  const ask = useAskPartner(show.id);
  const withdraw = useWithdrawPartner(show.id);
  const error = ask.error ?? withdraw.error;
  const isAskable = obstacle === null && classmates.length > 0;
  return (
    <div className="space-y-4">
      <ul className="divide-y divide-line border-y border-line">
        {authors.map(({ userId, name, isMe }) => (
          <PersonRow key={userId} name={isMe ? `${name} (you)` : name} standing="author">
            {isMe && authors.length > 1 && (
              <Button size="small" icon="sign-out" onPress={onLeave}>
                Leave
              </Button>
            )}
          </PersonRow>
        ))}
        {asked.map(({ userId, name }) => (
          <PersonRow key={userId} name={name} standing="asked, no answer yet">
            <Button
              size="small"
              isPending={withdraw.isPending && withdraw.variables === userId}
              aria-label={`Do not ask ${name}`}
              onPress={() => withdraw.mutate(userId)}
            >
              Take it back
            </Button>
          </PersonRow>
        ))}
      </ul>
      {isAskable ? (
        <form
          className="flex flex-wrap items-end gap-3"
          onSubmit={(event) => {
            event.preventDefault();
            if (chosen !== "") ask.mutate(UserIdSchema.parse(chosen), { onSuccess: () => setChosen("") });
          }}
        >
          <Select
            label="Ask a classmate"
            placeholder="Choose a classmate"
            value={chosen}
            onChange={(event) => setChosen(event.target.value)}
            options={classmates.map(({ userId, name }) => ({ value: userId, label: name }))}
            className="min-w-48 flex-1"
          />
          <Button
            look="main"
            type="submit"
            icon="plus"
            isPending={ask.isPending}
            disabledReason={chosen === "" ? "Choose a classmate first." : null}
          >
            Ask
          </Button>
        </form>
      ) : (
        <p className="text-soft">
          {obstacle ?? "Nobody of your class is free: everybody is asked already or has begun a show of their own."}
        </p>
      )}
      <p className="text-meta text-slate">
        Authors change the same script. When two write at once, both texts are kept for you to compare. A mark counts
        for every author.
      </p>
      {error && <Notice tone="stop" role="alert" title={error.message} />}
    </div>
  );
}

function PersonRow({ name, standing, children }: { name: string; standing: string; children?: ReactNode }) {
  return (
    <li className="flex min-h-12 items-center gap-3 py-1.5">
      <span className="font-[650]">{name}</span>
      <span className="text-meta text-slate">{standing}</span>
      <span className="ml-auto">{children}</span>
    </li>
  );
}
