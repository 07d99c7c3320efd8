import { describe, expect, it } from "vitest";
import { Transport, type PlaybackEngine } from "./transport-model.ts";

/** An engine that notes what it is told. */
class FakeEngine implements PlaybackEngine {
  isPlaying = false;
  hasSound = true;
  countInLeft = 0;
  position = 0;
  readonly calls: string[] = [];
  #listener: () => void = () => undefined;

  positionSeconds = () => this.position;
  play = () => {
    this.isPlaying = true;
    this.#listener();
    return Promise.resolve();
  };
  pause = () => {
    this.isPlaying = false;
    this.#listener();
  };
  seek = (seconds: number) => {
    this.position = seconds;
    this.calls.push(`seek ${seconds}`);
  };
  setLoop = (loop: { start: number; end: number } | null) =>
    void this.calls.push(loop ? `loop ${loop.start}-${loop.end}` : "no loop");
  setRate = (rate: number) => void this.calls.push(`rate ${rate}`);
  setMetronome = (isOn: boolean) => void this.calls.push(`metronome ${isOn}`);
  setCountIn = (isOn: boolean) => void this.calls.push(`count-in ${isOn}`);
  stream = () => null;
  setVolume = (volume: number) => void this.calls.push(`volume ${volume}`);
  subscribe = (listener: () => void) => {
    this.#listener = listener;
    return () => undefined;
  };
  dispose = () => void this.calls.push("dispose");

  end(): void {
    this.isPlaying = false;
    this.#listener();
  }
}

function setUp(load?: () => Promise<PlaybackEngine>) {
  const engine = new FakeEngine();
  let loads = 0;
  const transport = new Transport({
    endSeconds: 90,
    toSeconds: (tick) => tick / 960,
    loadPlayer: () => {
      loads += 1;
      return load?.() ?? Promise.resolve(engine);
    },
  });
  return { engine, transport, countLoads: () => loads };
}

describe("Transport", () => {
  it("loads the sound only when somebody presses play, and starts where it stands", async () => {
    const { engine, transport, countLoads } = setUp();
    transport.seek(12);
    transport.setRate(0.5);
    transport.setCountIn(true);
    expect(countLoads()).toBe(0);
    await transport.play();
    expect(engine.calls).toEqual(["seek 12", "rate 0.5", "volume 0.7", "no loop", "metronome false", "count-in true"]);
    expect(transport.state).toMatchObject({ isPlaying: true, isStarting: false });
  });

  it("keeps the place inside the song", () => {
    const { transport } = setUp();
    transport.seek(-4);
    expect(transport.positionSeconds()).toBe(0);
    transport.seek(900);
    expect(transport.positionSeconds()).toBe(90);
  });

  it("does not start when pause was pressed while the sound was loading", async () => {
    let arrive: (engine: PlaybackEngine) => void = () => undefined;
    const { engine, transport } = setUp(() => new Promise((resolve) => (arrive = resolve)));
    const starting = transport.play();
    transport.pause();
    arrive(engine);
    await starting;
    expect(engine.isPlaying).toBe(false);
    expect(transport.state.isPlaying).toBe(false);
  });

  it("says that it stopped when the song is over", async () => {
    const { engine, transport } = setUp();
    await transport.play();
    engine.end();
    expect(transport.state.isPlaying).toBe(false);
  });

  it("loops only what it is told to, in seconds", async () => {
    const { engine, transport } = setUp();
    await transport.play();
    transport.setLoop({ start: 960, end: 2880 }, true);
    transport.setLoop({ start: 960, end: 2880 }, false);
    expect(engine.calls.slice(-2)).toEqual(["loop 1-3", "no loop"]);
  });

  it("tries to load again after the sound did not come", async () => {
    let isOnline = false;
    const engine = new FakeEngine();
    const { transport, countLoads } = setUp(() =>
      isOnline ? Promise.resolve(engine) : Promise.reject(new Error("no network")),
    );
    await expect(transport.play()).rejects.toThrow("no network");
    expect(transport.state).toMatchObject({ isPlaying: false, isStarting: false });
    transport.toggle();
    await expect.poll(() => transport.state.hasFailed).toBe(true);
    isOnline = true;
    await transport.play();
    expect(countLoads()).toBe(3);
    expect(transport.state.hasFailed).toBe(false);
    expect(transport.isPlaying).toBe(true);
  });

  it("frees an engine that arrives after it was closed", async () => {
    let arrive: (engine: PlaybackEngine) => void = () => undefined;
    const { engine, transport } = setUp(() => new Promise((resolve) => (arrive = resolve)));
    const starting = transport.play();
    transport.dispose();
    arrive(engine);
    await starting;
    expect(engine.calls).toEqual(["dispose"]);
  });
});
