import { useQuery } from "@tanstack/react-query";
import type { Lineup } from "../../../../shared/contracts/lineup.ts";
import { Button } from "../../../components/button.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { Notice } from "../../../components/notice.tsx";
import { QueryView } from "../../../components/query-view.tsx";
import { Skeleton, SkeletonGroup } from "../../../components/skeleton.tsx";
import { Tag } from "../../../components/tag.tsx";
import { showToast } from "../../../components/toast-queue.ts";
import { usePublish } from "../api.ts";
import { findPublishObstacle, listPublicationChanges } from "../model/publication.ts";
import { programmeQuery } from "../programme/api.ts";

export interface PublishDialogProps {
  lineup: Lineup;
  onClose: () => void;
}

const KINDS = {
  new: { state: "ok", word: "New" },
  moved: { state: "warn", word: "Moved" },
  gone: { state: "declined", word: "Gone" },
} as const;

/** What publishing will change for families and the crew; asked before it is done, for it cannot be called back. */
export function PublishDialog({ lineup, onClose }: PublishDialogProps) {
  const programme = useQuery(programmeQuery);
  const publish = usePublish();
  const obstacle = findPublishObstacle(lineup);
  return (
    <Dialog
      isOpen
      onClose={onClose}
      title="Publish the lineup?"
      isBusy={publish.isPending}
      actions={
        <>
          <Button onPress={onClose}>Not yet</Button>
          <Button
            look="main"
            icon="send"
            isPending={publish.isPending}
            disabledReason={obstacle}
            onPress={() =>
              publish.mutate(undefined, {
                onSuccess: ({ number }) => {
                  showToast({
                    title: `Lineup ${number} is published.`,
                    detail: "Families see it in the programme now.",
                  });
                  onClose();
                },
              })
            }
          >
            Publish
          </Button>
        </>
      }
    >
      <p>
        Families see it in the programme at once, and the handover is made from it. What was published can not be called
        back, but a new lineup can replace it at any time.
      </p>
      {obstacle && <Notice tone="stop" title={obstacle} />}
      {publish.error && (
        <Notice tone="stop" role="alert" title="The lineup was not published.">
          {publish.error.message}
        </Notice>
      )}
      <h3>What changes</h3>
      <QueryView
        query={programme}
        errorTitle="The published programme could not be loaded."
        skeleton={
          <SkeletonGroup label="Loading the published programme" className="space-y-3">
            <Skeleton className="w-3/4" />
            <Skeleton className="w-2/3" />
          </SkeletonGroup>
        }
      >
        {({ shows }) => {
          const changes = listPublicationChanges(lineup, shows);
          if (changes.length === 0)
            return (
              <p className="text-soft">{lineup.changeCount > 0 ? "Only hours or closed nights change." : "Nothing."}</p>
            );
          return (
            <ul className="max-h-72 divide-y divide-line overflow-y-auto rounded-sheet border border-line bg-card">
              {changes.map((change) => (
                <li key={change.slotId} className="flex flex-wrap items-center gap-x-3 gap-y-1 px-3 py-2">
                  <Tag state={KINDS[change.kind].state}>{KINDS[change.kind].word}</Tag>
                  <b className="font-[650]">{change.title}</b>
                  <span className="text-slate">{change.place}</span>
                </li>
              ))}
            </ul>
          );
        }}
      </QueryView>
    </Dialog>
  );
}
