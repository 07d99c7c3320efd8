import { useState, type FormEvent } from "react";
import type { SongSummary } from "../../../../shared/contracts/songs.ts";
import type { ShowSummary } from "../../../../shared/contracts/shows.ts";
import type { AssignmentId, SongId } from "../../../../shared/ids.ts";
import { Button } from "../../../components/button.tsx";
import { Notice } from "../../../components/notice.tsx";
import { TextField } from "../../../components/text-field.tsx";
import { ApiProblem } from "../../../lib/api-client.ts";
import { presentLength } from "../../../lib/zoned-time.ts";
import { useCreateShow } from "../api.ts";

export interface NewShowFormProps {
  songs: readonly SongSummary[];
  /** For an assignment its song is fixed. */
  assignment?: { id: AssignmentId; songId: SongId };
  onCreated: (show: ShowSummary) => void;
}

/** A title and a song; the rest is the studio. */
export function NewShowForm({ songs, assignment, onCreated }: NewShowFormProps) {
  const [title, setTitle] = useState("");
  const [songId, setSongId] = useState<SongId | null>(assignment?.songId ?? songs[0]?.id ?? null);
  const create = useCreateShow();
  const [isTitleMissing, setIsTitleMissing] = useState(false);

  const handleSubmit = (event: FormEvent) => {
    event.preventDefault();
    setIsTitleMissing(title.trim() === "");
    if (title.trim() === "" || songId === null) return;
    create.mutate(
      { title, songId, assignmentId: assignment?.id ?? null },
      { onSuccess: ({ show }) => onCreated(show) },
    );
  };

  const refused =
    create.error instanceof ApiProblem ? create.error.errors.find((field) => field.pointer === "/title") : undefined;
  const offered = assignment ? songs.filter((song) => song.id === assignment.songId) : songs;
  return (
    <form onSubmit={handleSubmit} noValidate className="max-w-2xl space-y-6">
      {create.error && !refused && (
        <Notice tone="stop" role="alert" title="The show could not be started.">
          {create.error.message} Your title is still here; try again.
        </Notice>
      )}
      <TextField
        name="title"
        label="Title"
        hint="What will stand on the programme. You can change it later."
        value={title}
        onChange={(event) => setTitle(event.target.value)}
        maxLength={60}
        error={isTitleMissing ? "Give your show a title first." : (refused?.detail ?? null)}
      />
      <fieldset>
        <legend className="mb-2 font-semibold">Song</legend>
        <div className="space-y-2">
          {offered.map((song) => (
            <label
              key={song.id}
              className="flex cursor-pointer items-start gap-3 rounded-sheet border-[1.5px] border-rim bg-card px-4 py-3 has-checked:border-ink has-checked:bg-well"
            >
              <input
                type="radio"
                name="song"
                aria-label={song.title}
                className="mt-1 size-5 accent-main"
                value={song.id}
                checked={songId === song.id}
                onChange={() => setSongId(song.id)}
              />
              <span>
                <span className="font-semibold">{song.title}</span>
                <span className="block text-slate">
                  {presentLength(song.seconds)} · {Math.round(song.beatsPerMinute)} beats a minute, {song.beatsPerBar}{" "}
                  in a bar · {song.instruments.join(", ")}
                </span>
              </span>
            </label>
          ))}
        </div>
      </fieldset>
      <Button type="submit" look="main" icon="pencil" isPending={create.isPending}>
        Open the studio
      </Button>
    </form>
  );
}
