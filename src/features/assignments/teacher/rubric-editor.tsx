import type { Criterion } from "../../../../shared/contracts/assignments.ts";
import { Button } from "../../../components/button.tsx";
import { IconButton } from "../../../components/icon-button.tsx";
import { TextArea } from "../../../components/text-area.tsx";
import { TextField } from "../../../components/text-field.tsx";
import { buildCriterion, toFreeCriterionId } from "./starting-rubric.ts";

const MAX_CRITERIA = 8;

export interface RubricEditorProps {
  rubric: readonly Criterion[];
  onChange: (rubric: readonly Criterion[]) => void;
  /** The message for a box by its id, or null. */
  errorOf: (fieldId: string) => string | null;
}

/** Criteria with four levels each, weakest first; points are 1 to 4. */
export function RubricEditor({ rubric, onChange, errorOf }: RubricEditorProps) {
  const replace = (index: number, criterion: Criterion) =>
    onChange(rubric.map((old, place) => (place === index ? criterion : old)));
  const move = (index: number, step: -1 | 1) => {
    const next = [...rubric];
    const [moved] = next.splice(index, 1);
    if (moved) next.splice(index + step, 0, moved);
    onChange(next);
  };
  const rubricError = errorOf("rubric");
  return (
    <section aria-labelledby="rubric-heading" id="rubric" tabIndex={-1}>
      <h2 id="rubric-heading">Rubric</h2>
      <p className="mt-1 mb-3 text-slate">
        Students see it with the brief. Each criterion has four levels, weakest first, worth 1 to 4 points:{" "}
        {rubric.length * 4} in all.
      </p>
      {rubricError && <p className="mb-3 font-semibold text-rowan">{rubricError}</p>}
      <ol className="space-y-4">
        {rubric.map((criterion, index) => (
          <li key={criterion.id} className="rounded-sheet border border-line bg-card p-4 shadow-sheet-1">
            <fieldset>
              <legend className="sr-only">Criterion {index + 1}</legend>
              <div className="flex items-end gap-2">
                <TextField
                  id={`rubric-${index}-name`}
                  label={`Criterion ${index + 1}`}
                  value={criterion.name}
                  maxLength={60}
                  onChange={(event) => replace(index, { ...criterion, name: event.target.value })}
                  error={errorOf(`rubric-${index}-name`)}
                  className="flex-1"
                />
                <IconButton
                  icon="chevron-up"
                  label={`Move criterion ${index + 1} up`}
                  disabledReason={index === 0 ? "This is the first." : null}
                  onPress={() => move(index, -1)}
                />
                <IconButton
                  icon="chevron-down"
                  label={`Move criterion ${index + 1} down`}
                  disabledReason={index === rubric.length - 1 ? "This is the last." : null}
                  onPress={() => move(index, 1)}
                />
                <IconButton
                  icon="trash"
                  label={`Take criterion ${index + 1} out`}
                  onPress={() => onChange(rubric.filter((_, place) => place !== index))}
                />
              </div>
              <div className="mt-3 grid grid-cols-4 gap-3 max-wide:grid-cols-1">
                {criterion.levels.map((level, place) => {
                  const change = (part: Partial<typeof level>) =>
                    replace(index, {
                      ...criterion,
                      levels: criterion.levels.map((old, at) => (at === place ? { ...old, ...part } : old)),
                    });
                  return (
                    <div key={place} className="space-y-2">
                      <TextField
                        id={`rubric-${index}-levels-${place}-name`}
                        label={`Level ${place + 1}`}
                        value={level.name}
                        maxLength={20}
                        onChange={(event) => change({ name: event.target.value })}
                        error={errorOf(`rubric-${index}-levels-${place}-name`)}
                      />
                      <TextArea
                        id={`rubric-${index}-levels-${place}-text`}
                        label={`What level ${place + 1} means`}
                        isLabelHidden
                        rows={3}
                        value={level.text}
                        maxLength={200}
                        onChange={(event) => change({ text: event.target.value })}
                        error={errorOf(`rubric-${index}-levels-${place}-text`)}
                      />
                    </div>
                  );
                })}
              </div>
            </fieldset>
          </li>
        ))}
      </ol>
      <Button
        className="mt-3"
        icon="plus"
        disabledReason={rubric.length >= MAX_CRITERIA ? `A rubric has at most ${MAX_CRITERIA} criteria.` : null}
        onPress={() => onChange([...rubric, buildCriterion(toFreeCriterionId(rubric.map(({ id }) => id)), "")])}
      >
        Add a criterion
      </Button>
    </section>
  );
}
