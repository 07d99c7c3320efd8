import type { BeatMap } from "../../../../shared/contracts/songs.ts";
import type { ScriptNote } from "../../../../sandbox/engine/model.ts";
import { findSongPlace } from "../ribbon/song-place.ts";

export interface NotesPaneProps {
  song: BeatMap;
  notes: readonly ScriptNote[];
  onShow: (note: ScriptNote) => void;
}

/** Longer lists are cut: a note in a loop makes hundreds. */
const MOST_SHOWN = 200;

/** What the script said with `console.log`, in the order it was said. */
export function NotesPane({ song, notes, onShow }: NotesPaneProps) {
  if (notes.length === 0)
    return (
      <p className="studio-empty">
        No notes. Write <code>console.log(now());</code> to see a value here.
      </p>
    );
  return (
    <>
      <ol className="studio-notes">
        {notes.slice(0, MOST_SHOWN).map((note, index) => (
          <li key={index}>
            <button type="button" className="studio-ref" onClick={() => onShow(note)}>
              line {note.line}
            </button>
            <span className="studio-meta">bar {findSongPlace(song, note.tick).bar}</span>
            <code>{note.text}</code>
          </li>
        ))}
      </ol>
      <p className="studio-aid">
        What your script said with <code>console.log</code>
        {notes.length > MOST_SHOWN ? `: the first ${MOST_SHOWN} of ${notes.length}.` : "."}
      </p>
    </>
  );
}
