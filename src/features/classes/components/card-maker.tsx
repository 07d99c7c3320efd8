import { useState } from "react";
import type { ClassSummary, StudentRow } from "../../../../shared/contracts/classes.ts";
import type { UserId } from "../../../../shared/ids.ts";
import { Button } from "../../../components/button.tsx";
import { Checkbox } from "../../../components/checkbox.tsx";
import { ConfirmDialog } from "../../../components/confirm-dialog.tsx";
import { EmptyState } from "../../../components/empty-state.tsx";
import { LinkButton } from "../../../components/link-button.tsx";
import { useMadeCards, useMakeCards } from "../api.ts";
import { CardSheet } from "./card-sheet.tsx";

export interface CardMakerProps {
  classSummary: ClassSummary;
  students: readonly StudentRow[];
}

/** The class code, and sign-in cards to make and print for the students chosen. */
export function CardMaker({ classSummary, students }: CardMakerProps) {
  const [chosen, setChosen] = useState<ReadonlySet<UserId>>(new Set());
  const [isAsking, setIsAsking] = useState(false);
  const makeCards = useMakeCards(classSummary.id);
  const [cards, dropCards] = useMadeCards(classSummary.id);

  if (cards.length > 0) return <CardSheet className={classSummary.name} cards={cards} onDone={dropCards} />;
  if (students.length === 0) {
    return (
      <EmptyState
        icon="card"
        title="No cards to make yet"
        headingLevel={2}
        action={
          <LinkButton to={`/classes/${classSummary.id}`} look="main">
            Go to the students
          </LinkButton>
        }
      >
        Add students first. Each gets a card with the class code, a username and four words.
      </EmptyState>
    );
  }

  const allChosen = chosen.size === students.length;
  const toggle = (id: UserId, isOn: boolean) => {
    const next = new Set(chosen);
    if (isOn) next.add(id);
    else next.delete(id);
    setChosen(next);
  };
  return (
    <>
      <div className="mb-6 flex flex-wrap items-baseline gap-x-3">
        <h2>Class code</h2>
        <p className="font-mono text-5 font-bold">{classSummary.code}</p>
        <p className="text-slate">It names the class at the sign-in and is no secret: write it on the board.</p>
      </div>
      <h2>Sign-in cards</h2>
      <p className="mt-1 max-w-[70ch] text-soft">
        A card holds the class code, the username and four words. Words are kept only as a check value, so a lost card
        can not be printed again: making a card makes new words, and the old ones stop working.
      </p>
      <fieldset className="mt-4">
        <legend className="sr-only">Students who get a new card</legend>
        <div className="mb-2 flex flex-wrap items-center gap-4">
          <Checkbox
            label={<strong>All {students.length}</strong>}
            checked={allChosen}
            onChange={(event) => setChosen(new Set(event.target.checked ? students.map((student) => student.id) : []))}
          />
          <Button
            look="main"
            icon="card"
            className="ml-auto"
            disabledReason={chosen.size === 0 ? "Choose at least one student." : null}
            onPress={() => setIsAsking(true)}
          >
            {chosen.size === 0 ? "Make cards" : chosen.size === 1 ? "Make 1 card" : `Make ${chosen.size} cards`}
          </Button>
        </div>
        <div className="grid grid-cols-[repeat(auto-fill,minmax(13rem,1fr))] gap-x-6 rounded-sheet border border-line bg-card px-4 py-2 shadow-sheet-1">
          {students.map((student) => (
            <Checkbox
              key={student.id}
              checked={chosen.has(student.id)}
              onChange={(event) => toggle(student.id, event.target.checked)}
              label={
                <>
                  {student.displayName} <span className="font-mono text-meta text-slate">{student.username}</span>
                </>
              }
            />
          ))}
        </div>
      </fieldset>
      <ConfirmDialog
        isOpen={isAsking}
        tone="main"
        title={chosen.size === 1 ? "Make 1 new card?" : `Make ${chosen.size} new cards?`}
        confirmLabel="Make the cards"
        isPending={makeCards.isPending}
        error={makeCards.error?.message ?? null}
        onCancel={() => setIsAsking(false)}
        onConfirm={() => makeCards.mutate([...chosen], { onSuccess: () => setIsAsking(false) })}
      >
        <p>
          The words that {chosen.size === 1 ? "this student has" : "these students have"} now stop working at once. The
          new ones are shown only until you close them, so print them right away.
        </p>
      </ConfirmDialog>
    </>
  );
}
