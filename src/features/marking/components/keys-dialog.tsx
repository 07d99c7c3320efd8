import { Checkbox } from "../../../components/checkbox.tsx";
import { Dialog } from "../../../components/dialog.tsx";
import { Kbd } from "../../../components/kbd.tsx";
import { DESK_KEYS } from "../model/desk-keys.ts";
import { setKeysOn, useAreKeysOn } from "../use-desk-keys.ts";

export interface KeysDialogProps {
  isOpen: boolean;
  onClose: () => void;
}

/** Every key of the desk, and the way to turn them off. */
export function KeysDialog({ isOpen, onClose }: KeysDialogProps) {
  const areKeysOn = useAreKeysOn();
  return (
    <Dialog isOpen={isOpen} onClose={onClose} title="Keys of the marking desk" size="small">
      <dl className="grid grid-cols-[auto_1fr] items-baseline gap-x-4 gap-y-2">
        {DESK_KEYS.map((key) => (
          <div key={key.does} className="contents">
            <dt className="flex gap-1">
              {key.keys.map((name) => (
                <Kbd key={name}>{name}</Kbd>
              ))}
            </dt>
            <dd>{key.does}</dd>
          </div>
        ))}
      </dl>
      <p className="text-soft">
        Inside a text field the keys write. In the comment box Ctrl and Enter save, Escape closes.
      </p>
      <Checkbox
        label="Use single keys"
        hint="Turn them off if keys are pressed by chance or you speak to the computer. ? still opens this list."
        checked={areKeysOn}
        onChange={(event) => setKeysOn(event.target.checked)}
      />
    </Dialog>
  );
}
