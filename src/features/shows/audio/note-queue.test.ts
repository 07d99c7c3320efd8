import { describe, expect, it } from "vitest";
import { findDrum } from "./drum-kit.ts";
import { HeardClock } from "./heard-clock.ts";
import { findFamily } from "./instrument-family.ts";
import { NoteQueue } from "./note-queue.ts";

const note = (start: number, lasts: number, pitch = 60) => ({ start, lasts, pitch, velocity: 0.8 });
const track = { program: null, isDrums: false };
const queue = new NoteQueue({
  seconds: 20,
  tracks: [
    { ...track, name: "bells", notes: [note(0, 1), note(2, 1), note(4, 1)] },
    { ...track, name: "strings", notes: [note(0.5, 10, 48), note(3, 0.5, 50)] },
  ],
});

describe("NoteQueue", () => {
  it("lists what starts in a half-open stretch, over all tracks", () => {
    expect(queue.listStarting(0.5, 4).map(({ start, track: index }) => [start, index])).toEqual([
      [0.5, 1],
      [2, 0],
      [3, 1],
    ]);
    expect(queue.listStarting(50, 60)).toEqual([]);
  });

  it("lists what still sounds after a jump, not what starts there", () => {
    expect(queue.listSounding(4).map(({ start }) => start)).toEqual([0.5]);
    expect(queue.listSounding(2.5).map(({ start }) => start)).toEqual([0.5, 2]);
  });
});

describe("findFamily", () => {
  it("goes by channel, then program, then name", () => {
    expect(findFamily({ name: "bells", program: 9, isDrums: true })).toBe("drums");
    expect(findFamily({ name: "bells", program: 48, isDrums: false })).toBe("strings");
    expect(findFamily({ name: "low bass", program: null, isDrums: false })).toBe("bass");
    expect(findFamily({ name: "melody", program: null, isDrums: false })).toBe("bells");
  });

  it("has a family for every General MIDI program", () => {
    for (let program = 0; program < 128; program += 1)
      expect(findFamily({ name: "", program, isDrums: false })).not.toBe("drums");
  });
});

describe("findDrum", () => {
  it("knows the drums of the General MIDI percussion key map", () => {
    expect([36, 38, 42, 49, 47].map(findDrum)).toEqual(["kick", "snare", "hat", "crash", "tom"]);
  });
});

describe("HeardClock", () => {
  it("runs evenly although the audio clock moves in steps, behind it by the latency", () => {
    let page = 100;
    const audio = { currentTime: 0, outputLatency: 0.03 };
    const clock = new HeardClock(audio, () => page);
    const steps: number[] = [];
    let last = clock.now();
    for (let frame = 1; frame <= 300; frame += 1) {
      page = 100 + frame / 60;
      audio.currentTime = Math.floor((frame / 60) * 50) / 50;
      const now = clock.now();
      steps.push(now - last);
      last = now;
    }
    expect(Math.max(...steps)).toBeLessThan(1.3 / 60);
    expect(Math.min(...steps)).toBeGreaterThan(0.7 / 60);
    expect(Math.abs(last - (5 - 0.03))).toBeLessThan(0.001);
  });

  it("follows a jump of the audio clock at once", () => {
    let page = 0;
    const audio = { currentTime: 0 };
    const clock = new HeardClock(audio, () => page);
    clock.now();
    page = 1;
    audio.currentTime = 3;
    expect(clock.now()).toBe(3);
  });
});
