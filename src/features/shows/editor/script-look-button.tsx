import { Icon } from "../../../components/icon.tsx";
import { useDisclosure } from "../../../hooks/use-disclosure.ts";
import type { ScriptLook } from "./use-script-look.ts";

/** Opens to the choices of how the script looks: large letters, strong contrast. */
export function ScriptLookButton({ look }: { look: ScriptLook }) {
  const { isOpen, panelId, rootRef, toggle } = useDisclosure();
  return (
    <div ref={rootRef} className="script-look">
      <button
        type="button"
        className="studio-quiet-icon"
        aria-label="How the script looks"
        aria-expanded={isOpen}
        aria-controls={panelId}
        onClick={toggle}
      >
        <Icon name="letters" />
      </button>
      {isOpen && (
        <div id={panelId} className="script-look-sheet">
          <Choice isOn={look.isLarge} onChange={look.setLarge}>
            Large letters
          </Choice>
          <Choice isOn={look.isStrong} onChange={look.setStrong}>
            Strong contrast
          </Choice>
        </div>
      )}
    </div>
  );
}

function Choice({ isOn, onChange, children }: { isOn: boolean; onChange: (isOn: boolean) => void; children: string }) {
  return (
    <label>
      <input type="checkbox" checked={isOn} onChange={(event) => onChange(event.currentTarget.checked)} />
      {children}
    </label>
  );
}
