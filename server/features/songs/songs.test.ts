import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { contracts } from "../../../shared/contracts/index.ts";
import type { SongId } from "../../../shared/ids.ts";
import { buildBeatMap } from "../../../sandbox/music/beat-map.ts";
import type { MidiFile } from "../../../sandbox/music/midi-file.ts";
import { writeMidi } from "../../../sandbox/music/write-midi.ts";
import { beatMaps, songs } from "../../db/schema/index.ts";
import { buildSong, buildSongFile, buildUser } from "../../../tests/support/factories.ts";
import { createTestServer, type TestServer } from "../../../tests/support/test-server.ts";

/** Two bars of 4/4 at 120 beats a minute: quarter notes C4 to C5. */
const TUNE: MidiFile = {
  format: 1,
  ticksPerQuarter: 480,
  tempos: [{ tick: 0, microsPerQuarter: 500_000 }],
  meters: [{ tick: 0, beats: 4, unit: 4 }],
  markers: [],
  tracks: [
    {
      name: "bells",
      program: 14,
      notes: [60, 62, 64, 65, 67, 69, 71, 72].map((pitch, n) => ({
        tick: n * 480,
        ticks: 480,
        pitch,
        velocity: 100,
        channel: 0,
      })),
    },
  ],
};

let server: TestServer;
let userId: string;
beforeEach(() => {
  server = createTestServer();
  userId = buildUser(server.db).id;
});
afterEach(() => server.dispose());

function insertTune(): SongId {
  const bytes = Buffer.from(writeMidi(TUNE));
  server.db
    .insert(songs)
    .values({ id: "tune", title: "Two bars", credit: "made for this test", currentBeatMapId: "tune-beats" })
    .run();
  server.db
    .insert(beatMaps)
    .values({ id: "tune-beats", songId: "tune", number: 1, beatMap: buildBeatMap(TUNE), createdAt: 0 })
    .run();
  buildSongFile(server.db, { songId: "tune", bytes });
  return "tune";
}

describe("GET /api/songs", () => {
  it("lists songs by title with length, mean tempo and instruments", async () => {
    insertTune();
    buildSong(server.db, { title: "A first one" });
    const { status, body } = await server.call(contracts.songs.list, {}, { as: userId });
    expect(status).toBe(200);
    expect(body.songs.map((song: { title: string }) => song.title)).toEqual(["A first one", "Two bars"]);
    // Eight quarter notes of 0.5 s each are 4 s at 120 beats a minute.
    expect(body.songs[1]).toMatchObject({ seconds: 4, beatsPerMinute: 120, beatsPerBar: 4, instruments: ["bells"] });
  });

  it("refuses whoever is not signed in", async () => {
    expect((await server.call(contracts.songs.list, {})).status).toBe(401);
  });
});

describe("GET /api/songs/:songId", () => {
  it("gives the score in seconds beside the beat map", async () => {
    const { status, body } = await server.call(
      contracts.songs.get,
      { params: { songId: insertTune() } },
      { as: userId },
    );
    expect(status).toBe(200);
    expect(body.beatMap.beats).toHaveLength(9);
    const [bells] = body.score.tracks;
    expect(bells.name).toBe("bells");
    expect(bells.notes[3]).toMatchObject({
      start: expect.closeTo(1.5, 9),
      lasts: expect.closeTo(0.5, 9),
      pitch: 65,
    });
  });

  it("answers not-found for an unknown song", async () => {
    const { status, body } = await server.call(contracts.songs.get, { params: { songId: "nothing" } }, { as: userId });
    expect(status).toBe(404);
    expect(body.type).toBe("/problems/not-found");
  });
});
