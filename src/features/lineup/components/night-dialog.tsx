import { useState } from "react";
import type { Night } from "../../../../shared/contracts/lineup.ts";
import { Button } from "../../../components/button.tsx";
import { Checkbox } from "../../../components/checkbox.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { Notice } from "../../../components/notice.tsx";
import { TextField } from "../../../components/text-field.tsx";
import { findFieldError } from "../../../lib/field-error.ts";
import { presentDate } from "../../../lib/zoned-time.ts";
import { useSetNight } from "../api.ts";

export interface NightDialogProps {
  night: Night;
  /** Shows placed on it: they become stops when the night closes. */
  showCount: number;
  onClose: () => void;
}

/** A night's hours, or why nothing runs. */
export function NightDialog({ night, showCount, onClose }: NightDialogProps) {
  const [opensAt, setOpensAt] = useState(night.opensAt);
  const [closesAt, setClosesAt] = useState(night.closesAt);
  const [isClosed, setIsClosed] = useState(night.closedReason !== null);
  const [reason, setReason] = useState(night.closedReason ?? "");
  const [isTried, setIsTried] = useState(false);
  const setNight = useSetNight();
  const reasonError =
    isTried && isClosed && reason.trim() === ""
      ? "Say why, so that families know."
      : findFieldError(setNight.error, "/closedReason");
  const hoursError = isTried && opensAt === "" ? "Choose a time." : findFieldError(setNight.error, "/opensAt");
  const closeError =
    isTried && closesAt <= opensAt
      ? "Quiet hour has to come after the first show."
      : findFieldError(setNight.error, "/closesAt");
  const isGeneralError =
    setNight.error !== null && [reasonError, hoursError, closeError].every((message) => message === null);

  const save = () => {
    setIsTried(true);
    if ((isClosed && reason.trim() === "") || opensAt === "" || closesAt <= opensAt) return;
    setNight.mutate(
      { nightId: night.id, opensAt, closesAt, closedReason: isClosed ? reason.trim() : null },
      { onSuccess: onClose },
    );
  };
  return (
    <Dialog
      isOpen
      onClose={onClose}
      size="small"
      title={presentDate(night.date, "full")}
      isBusy={setNight.isPending}
      actions={
        <>
          <Button onPress={onClose}>Cancel</Button>
          <Button look="main" onPress={save} isPending={setNight.isPending}>
            Save
          </Button>
        </>
      }
    >
      <div className="grid grid-cols-2 gap-4">
        <TextField
          label="First show from"
          type="time"
          value={opensAt}
          onChange={(event) => setOpensAt(event.target.value)}
          error={hoursError}
        />
        <TextField
          label="Quiet from"
          hint="Every show is over by then."
          type="time"
          value={closesAt}
          onChange={(event) => setClosesAt(event.target.value)}
          error={closeError}
        />
      </div>
      <Checkbox
        label="Closed: nothing runs this night"
        checked={isClosed}
        onChange={(event) => setIsClosed(event.target.checked)}
      />
      {isClosed && (
        <TextField
          label="Why"
          hint="Families read it in the programme."
          placeholder="Market day"
          value={reason}
          maxLength={80}
          onChange={(event) => setReason(event.target.value)}
          error={reasonError}
        />
      )}
      {isClosed && night.closedReason === null && showCount > 0 && (
        <Notice
          tone="warn"
          title={showCount === 1 ? "1 show is placed on this night." : `${showCount} shows are placed on this night.`}
        >
          They stay where they are and hold up the publishing until you move them.
        </Notice>
      )}
      {isGeneralError && (
        <Notice tone="stop" role="alert" title="The night was not changed.">
          {setNight.error?.message}
        </Notice>
      )}
    </Dialog>
  );
}
