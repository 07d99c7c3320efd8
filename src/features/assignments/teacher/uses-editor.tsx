import { REQUIREMENT_NAMES } from "../../../../shared/contracts/assignments.ts";
import { Checkbox } from "../../../components/checkbox.tsx";
import { Select } from "../../../components/select.tsx";
import { type AssignmentDraft, REQUIREMENT_KINDS } from "./assignment-form-model.ts";

const COUNTS = [1, 2, 3, 4, 5, 6, 8, 10];

export interface UsesEditorProps {
  uses: AssignmentDraft["uses"];
  onChange: (uses: AssignmentDraft["uses"]) => void;
}

/** What a script must use, each with how often. */
export function UsesEditor({ uses, onChange }: UsesEditorProps) {
  return (
    <fieldset id="requirements" tabIndex={-1}>
      <legend className="mb-1.5 font-semibold">The script must use</legend>
      <div className="grid grid-cols-2 gap-x-8 gap-y-1 max-wide:grid-cols-1">
        {REQUIREMENT_KINDS.map((kind) => (
          <div key={kind} className="flex min-h-9 items-center gap-3">
            <Checkbox
              label={REQUIREMENT_NAMES[kind]}
              checked={uses[kind] > 0}
              onChange={(event) => onChange({ ...uses, [kind]: event.target.checked ? 1 : 0 })}
            />
            {uses[kind] > 0 && (
              <Select
                label={`How often: ${REQUIREMENT_NAMES[kind]}`}
                isLabelHidden
                className="ml-auto w-36"
                value={String(uses[kind])}
                onChange={(event) => onChange({ ...uses, [kind]: Number(event.target.value) })}
                options={[...new Set([...COUNTS, uses[kind]])]
                  .sort((a, b) => a - b)
                  .map((count) => ({
                    value: String(count),
                    label: count === 1 ? "at least once" : `at least ${count} times`,
                  }))}
              />
            )}
          </div>
        ))}
      </div>
      <p className="mt-1.5 text-meta text-slate">
        Found in the script by itself, shown to the student while writing and to you while marking.
      </p>
    </fieldset>
  );
}
