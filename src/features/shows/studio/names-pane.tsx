import { useState } from "react";
import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import type { Layout } from "../../../../shared/contracts/square.ts";
import type { ScriptName, ScriptNames } from "../editor/script-names.ts";
import { MomentsRuler } from "./moments-ruler.tsx";
import { NamesMap } from "./names-map.tsx";
import { NamesList } from "./names-list.tsx";
import type { ShowPlayer } from "./show-player.ts";

const VIEWS = [
  { id: "fronts", word: "Fronts" },
  { id: "moments", word: "Moments" },
  { id: "song", word: "Song" },
  { id: "colours", word: "Colours" },
  { id: "words", word: "Words" },
] as const;
type View = (typeof VIEWS)[number]["id"];

export interface NamesPaneProps {
  layout: Layout;
  song: BeatMap;
  player: ShowPlayer;
  names: ScriptNames;
  /** Puts code into the script at the cursor. */
  onInsert: (code: string) => void;
}

/** All names a script may use: the fronts on a map of the square, the song's sections and instruments, colours, words. */
export function NamesPane({ layout, song, player, names, onInsert }: NamesPaneProps) {
  const [view, setView] = useState<View>("fronts");
  return (
    <div className="studio-names">
      <div className="studio-names-views" role="group" aria-label="Names of">
        {VIEWS.map(({ id, word }) => (
          <button key={id} type="button" className="studio-chip" aria-pressed={view === id} onClick={() => setView(id)}>
            {word}
          </button>
        ))}
      </div>
      {view === "fronts" && <NamesMap layout={layout} onInsert={onInsert} />}
      {view === "moments" && <MomentsRuler song={song} player={player} onInsert={onInsert} />}
      {view === "song" && <NamesList items={listSongNames(names)} label="Names of the song" onInsert={onInsert} />}
      {view === "colours" && (
        <NamesList
          items={names.colour.map((colour) => ({ ...colour, code: `"${colour.name}"` }))}
          label="Colours"
          onInsert={onInsert}
          isDense
        />
      )}
      {view === "words" && <NamesList items={null} label="Words of the language" onInsert={onInsert} />}
    </div>
  );
}

function listSongNames(names: ScriptNames): (ScriptName & { code: string })[] {
  return [
    ...names.section.map((section) => ({ ...section, code: `song.section("${section.name}")` })),
    ...names.instrument.map((instrument) => ({ ...instrument, code: `song.hits("${instrument.name}")` })),
    ...names.part.map((part) => ({ ...part, code: `square.parts("${part.name}")` })),
    ...names.side.map((side) => ({ ...side, code: `square.side("${side.name}")` })),
  ];
}
