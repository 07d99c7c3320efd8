import { useState } from "react";
import type { Lineup, Slot } from "../../../../shared/contracts/lineup.ts";
import { Dialog } from "../../../components/dialog.tsx";
import { PictureRibbon } from "../../../components/picture-ribbon.tsx";
import { TextField } from "../../../components/text-field.tsx";
import { presentLength } from "../../../lib/zoned-time.ts";
import { presentPlace } from "../model/change.ts";
import { listTray, presentNights } from "../model/tray.ts";

export interface ChooseShowDialogProps {
  lineup: Lineup;
  nightId: Slot["nightId"];
  startsAt: string;
  onChoose: (forwardId: Slot["forwardId"]) => void;
  onClose: () => void;
}

/** Chooses the show for a free time, those with the fewest nights first. */
export function ChooseShowDialog({ lineup, nightId, startsAt, onChoose, onClose }: ChooseShowDialogProps) {
  const [query, setQuery] = useState("");
  const items = listTray(lineup, query, "fewest");
  return (
    <Dialog isOpen onClose={onClose} title={`${presentPlace(lineup, nightId, startsAt)}: which show?`}>
      <TextField
        label="Find a show, a name or a school"
        type="search"
        autoFocus
        value={query}
        onChange={(event) => setQuery(event.target.value)}
      />
      {items.length === 0 ? (
        <p className="text-slate">
          {lineup.shows.length === 0 ? "No show is approved yet." : `No show fits “${query}”.`}
        </p>
      ) : (
        <ul className="divide-y divide-line rounded-sheet border border-line bg-card">
          {items.map(({ show, nightCount }) => (
            <li key={show.id}>
              <button
                type="button"
                onClick={() => onChoose(show.id)}
                className="grid w-full grid-cols-[minmax(0,1fr)_auto] gap-x-3 gap-y-1 px-3 py-2 text-left -outline-offset-3! hover:bg-well"
              >
                <b className="font-[650]">{show.title}</b>
                <span className="text-slate tabular-nums">{presentLength(show.seconds)}</span>
                <span className="col-span-2">
                  <PictureRibbon picture={show.ribbon} size="row" label="" />
                </span>
                <span className="col-span-2 text-meta text-slate">
                  {show.publicName} · {presentNights(nightCount)}
                </span>
              </button>
            </li>
          ))}
        </ul>
      )}
    </Dialog>
  );
}
