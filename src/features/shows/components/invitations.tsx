import { useQuery } from "@tanstack/react-query";
import type { Invitation } from "../../../../shared/contracts/partners.ts";
import { Button } from "../../../components/button.tsx";
import { Notice } from "../../../components/notice.tsx";
import { showToast } from "../../../components/toast-queue.ts";
import { invitationsQuery, useAnswerInvitation } from "../partners-api.ts";

/** Shows that classmates ask the reader to write with them; nothing when there is none. */
export function Invitations() {
  const { data } = useQuery(invitationsQuery);
  if (!data || data.length === 0) return null;
  return (
    <section aria-label="Classmates ask you" className="my-4 space-y-3">
      {data.map((invitation) => (
        <InvitationNotice key={invitation.showId} invitation={invitation} />
      ))}
    </section>
  );
}

function InvitationNotice({ invitation }: { invitation: Invitation }) {
  const answer = useAnswerInvitation();
  const { showId, title, songTitle, assignmentTitle, by } = invitation;
  return (
    <Notice
      icon="people"
      title={`${by} asks you to write “${title}” together.`}
      actions={
        <>
          <Button
            look="main"
            icon="check"
            isPending={answer.isPending && answer.variables.answer === "join"}
            onPress={() =>
              answer.mutate(
                { showId, answer: "join" },
                { onSuccess: () => showToast({ title: `You write “${title}” with ${by}.` }) },
              )
            }
          >
            Join
          </Button>
          <Button
            isPending={answer.isPending && answer.variables.answer === "decline"}
            onPress={() =>
              answer.mutate(
                { showId, answer: "decline" },
                { onSuccess: () => showToast({ title: `You said no to “${title}”.`, detail: `${by} can ask again.` }) },
              )
            }
          >
            No, thanks
          </Button>
        </>
      }
    >
      <p>
        {songTitle}
        {assignmentTitle === null ? "" : `, for ${assignmentTitle}`}. Both of you change the same script. A mark counts
        for both.
      </p>
      {answer.error && (
        <p role="alert" className="font-bold text-rowan">
          {answer.error.message}
        </p>
      )}
    </Notice>
  );
}
