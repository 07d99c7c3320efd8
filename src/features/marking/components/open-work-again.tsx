import { useNavigate } from "react-router";
import type { SubmissionId } from "../../../../shared/ids.ts";
import { Button } from "../../../components/button.tsx";
import { Notice } from "../../../components/notice.tsx";
import { useReopenForDesk } from "../api.ts";

export interface OpenWorkAgainProps {
  submissionId: SubmissionId;
  title: string;
}

/** Takes a released mark back and goes to the desk, from where the work can be sent back with the event's reason. */
export function OpenWorkAgain({ submissionId, title }: OpenWorkAgainProps) {
  const navigate = useNavigate();
  const reopen = useReopenForDesk();
  return (
    <div className="space-y-3">
      <p className="text-soft">
        Open the work again to send it back to its authors with this note. The released mark is hidden until you release
        it anew.
      </p>
      <Button
        look="main"
        icon="turn"
        isPending={reopen.isPending}
        onPress={() =>
          reopen.mutate(submissionId, {
            onSuccess: (assignmentId) => void navigate(`/marking/${assignmentId}/${submissionId}`),
          })
        }
      >
        Open the work again
      </Button>
      {reopen.error && (
        <Notice tone="stop" role="alert" title={`The work on ${title} was not opened.`}>
          {reopen.error.message}
        </Notice>
      )}
    </div>
  );
}
