import { useEffect, useState } from "react";
import type { SignInCard } from "../../../../shared/contracts/classes.ts";
import { Button } from "../../../components/button.tsx";
import { ConfirmDialog } from "../../../components/confirm-dialog.tsx";
import { Mark } from "../../../components/mark.tsx";
import { Notice } from "../../../components/notice.tsx";

export interface CardSheetProps {
  className: string;
  cards: readonly SignInCard[];
  onDone: () => void;
}

/** Sign-in cards to print on A4 and cut along the dashed lines. Readable now and never again. */
export function CardSheet({ className, cards, onDone }: CardSheetProps) {
  const [isAsking, setIsAsking] = useState(false);
  useEffect(() => {
    // A closed tab would lose words that nobody can read again.
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener("beforeunload", warn);
    return () => window.removeEventListener("beforeunload", warn);
  }, []);
  return (
    <>
      <div className="print:hidden">
        <Notice
          tone="warn"
          title={cards.length === 1 ? "1 new card. Print it now." : `${cards.length} new cards. Print them now.`}
          actions={
            <>
              <Button look="main" icon="print" onPress={() => window.print()}>
                Print the cards
              </Button>
              <Button onPress={() => setIsAsking(true)}>Done, close the cards</Button>
            </>
          }
        >
          The words can not be shown again. A4, ten cards a page; cut along the dashed lines.
        </Notice>
      </div>
      <ul
        aria-label={`Sign-in cards of ${className}`}
        className="mt-4 grid grid-cols-[repeat(auto-fill,minmax(19rem,1fr))] gap-3 print:mt-0 print:grid-cols-2 print:gap-0"
      >
        {cards.map((card) => (
          <li
            key={card.studentId}
            className="break-inside-avoid border-[1.5px] border-dashed border-rim bg-card px-4 py-3 print:min-h-[52mm] print:border-1"
          >
            <p className="flex items-center gap-2 font-head text-4 font-bold">
              <span className="rounded-cut bg-dusk p-1">
                <Mark className="h-5 w-[18px]" />
              </span>
              {card.displayName}
              <span className="ml-auto font-text text-meta font-normal text-slate">{className}</span>
            </p>
            <dl className="mt-2 grid grid-cols-[6.5rem_1fr] gap-y-0.5 [&_dt]:text-meta [&_dt]:text-slate">
              <dt>Sign in at</dt>
              <dd className="font-mono">{window.location.host}</dd>
              <dt>Class code</dt>
              <dd className="font-mono font-bold">{card.classCode}</dd>
              <dt>Username</dt>
              <dd className="font-mono font-bold">{card.username}</dd>
              <dt>Four words</dt>
              <dd className="font-mono font-bold wrap-anywhere">{card.passphrase.replaceAll("-", " ")}</dd>
            </dl>
            <p className="mt-2 text-meta text-slate">Keep it like a key. Your teacher can give you a new one.</p>
          </li>
        ))}
      </ul>
      <ConfirmDialog
        isOpen={isAsking}
        tone="main"
        title="Close the cards?"
        confirmLabel="Close them"
        cancelLabel="Keep them open"
        onCancel={() => setIsAsking(false)}
        onConfirm={onDone}
      >
        <p>Nobody can read these words again after that. If a card is lost, you can make a new one.</p>
      </ConfirmDialog>
    </>
  );
}
