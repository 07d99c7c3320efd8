/**
 * The one door to Tone. Its main entry opens an audio context as soon as it is imported, with a clock
 * in a worker made from a blob, which our content policy forbids; the classes alone do not. Every
 * node still asks for the global context, so `useContext` comes before the first node.
 */
import "./silence-tone.ts";
import {
  Context,
  FMSynth,
  MembraneSynth,
  MonoSynth,
  NoiseSynth,
  OfflineContext,
  Synth,
} from "tone/build/esm/classes.js";
import { setContext } from "tone/build/esm/core/context/GlobalContext.js";

export { FMSynth, MembraneSynth, MonoSynth, NoiseSynth, OfflineContext, Synth };
export type { Context };

/** A live context whose clock is a timer of the page. It makes no sound until `resume` after a user's act. */
export function createLiveContext(): Context {
  const context = new Context({ clockSource: "timeout", latencyHint: "interactive", lookAhead: 0.02 });
  setContext(context);
  return context;
}

/** A context that renders `seconds` of one channel as fast as it can. */
export function createOfflineContext(seconds: number, sampleRate: number): OfflineContext {
  const context = new OfflineContext(1, seconds, sampleRate);
  setContext(context);
  return context;
}
