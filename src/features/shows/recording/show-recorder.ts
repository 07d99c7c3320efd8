import type { Layout, Side } from "../../../../shared/contracts/square.ts";
import { Stage } from "../stage/stage.ts";
import { UnrolledStrip } from "../stage/unrolled-strip.ts";
import type { ShowPlayer } from "../studio/show-player.ts";

/** Size of the video; the strip of the whole square is its lower part. */
export const VIDEO_SIZE = { width: 1280, height: 720, strip: 120 } as const;
const FRAMES_PER_SECOND = 30;
const VIDEO_BITS_PER_SECOND = 5_000_000;
const CHUNK_MS = 1000;

/** Best first: the first plays everywhere, the others in most places. Names of RFC 6381. */
const FORMATS = [
  { type: "video/mp4;codecs=avc1.42E01F,mp4a.40.2", ending: "mp4" },
  { type: "video/webm;codecs=vp9,opus", ending: "webm" },
  { type: "video/webm;codecs=vp8,opus", ending: "webm" },
  { type: "video/webm", ending: "webm" },
] as const;

export interface VideoFormat {
  readonly type: string;
  /** Of the file's name. */
  readonly ending: string;
}

/** A format that this browser can make, or null. */
export function findVideoFormat(): VideoFormat | null {
  if (typeof MediaRecorder === "undefined" || !("captureStream" in HTMLCanvasElement.prototype)) return null;
  return FORMATS.find(({ type }) => MediaRecorder.isTypeSupported(type)) ?? null;
}

/** Why a recording ended without a video. */
export class RecordingStoppedError extends Error {
  override readonly name = "RecordingStoppedError";
}

export interface RecordingOptions {
  readonly player: ShowPlayer;
  readonly layout: Layout;
  readonly side: Side;
  readonly format: VideoFormat;
  /** Where the picture is drawn; its size is set. */
  readonly canvas: HTMLCanvasElement;
  /** Share of the song that is recorded, 0 to 1. */
  readonly onProgress: (share: number) => void;
}

/**
 * Records a show from its first beat to its last, picture and sound, in the time it takes to play.
 * `cancel` ends it; the player is left as it was, but for its place.
 */
export class ShowRecorder {
  readonly #options: RecordingOptions;
  readonly #stage: Stage;
  readonly #strip: UnrolledStrip;
  readonly #layers: readonly HTMLCanvasElement[];
  #cancel: (reason: RecordingStoppedError) => void = () => undefined;

  constructor(options: RecordingOptions) {
    this.#options = options;
    const { width, height, strip } = VIDEO_SIZE;
    options.canvas.width = width;
    options.canvas.height = height;
    const layers = [document.createElement("canvas"), document.createElement("canvas")] as const;
    this.#layers = layers;
    this.#stage = new Stage(layers[0], options.layout);
    this.#stage.look(options.side);
    this.#stage.setSize({ width, height: height - strip, dpr: 1 });
    this.#strip = new UnrolledStrip(layers[1], options.layout);
    this.#strip.setSize({ width, height: strip, dpr: 1 });
  }

  /** The video. Call from the person's own act. Rejects with `RecordingStoppedError` when it was cancelled or the page was hidden. */
  async record(): Promise<Blob> {
    const { player, canvas, format } = this.#options;
    const { transport } = player;
    const before = transport.state;
    transport.setLoop(before.loop, false);
    transport.setRate(1);
    transport.setMetronome(false);
    transport.setCountIn(false);
    player.seekTick(0);
    const context = canvas.getContext("2d");
    const stopView = player.addView({
      showMoment: ({ tick, rgb }) => {
        this.#stage.draw(rgb);
        this.#strip.draw(rgb);
        const [stage, strip] = this.#layers;
        if (stage) context?.drawImage(stage, 0, 0);
        if (strip) context?.drawImage(strip, 0, VIDEO_SIZE.height - VIDEO_SIZE.strip);
        this.#options.onProgress(tick / player.tempo.endTick);
      },
    });
    try {
      // The sound is loaded by the first press of play; only then is there something to record.
      await transport.play();
      transport.pause();
      player.seekTick(0);
      const stream = canvas.captureStream(FRAMES_PER_SECOND);
      for (const track of transport.stream()?.getAudioTracks() ?? []) stream.addTrack(track);
      return await this.#follow(
        new MediaRecorder(stream, { mimeType: format.type, videoBitsPerSecond: VIDEO_BITS_PER_SECOND }),
      );
    } finally {
      stopView();
      transport.pause();
      transport.setLoop(before.loop, before.isLooping);
      transport.setRate(before.rate);
      transport.setMetronome(before.hasMetronome);
      transport.setCountIn(before.hasCountIn);
    }
  }

  cancel(): void {
    this.#cancel(new RecordingStoppedError("The recording was cancelled."));
  }

  dispose(): void {
    this.cancel();
    this.#stage.dispose();
    this.#strip.dispose();
  }

  async #follow(recorder: MediaRecorder): Promise<Blob> {
    const { player, format } = this.#options;
    const chunks: Blob[] = [];
    recorder.addEventListener("dataavailable", (event) => chunks.push(event.data));
    const ended = new Promise<void>((resolve) => recorder.addEventListener("stop", () => resolve()));
    const failed = new Promise<never>((_, reject) => {
      recorder.addEventListener("error", () => reject(new RecordingStoppedError("The browser stopped the recording.")));
      this.#cancel = reject;
    });
    failed.catch(() => undefined);
    const handleHidden = () => {
      if (document.hidden)
        this.#cancel(new RecordingStoppedError("The page was hidden, and a hidden page draws no picture."));
    };
    document.addEventListener("visibilitychange", handleHidden);
    try {
      recorder.start(CHUNK_MS);
      await Promise.race([player.transport.play(), failed]);
      await Promise.race([untilStopped(player), failed]);
      recorder.stop();
      await Promise.race([ended, failed]);
      return new Blob(chunks, { type: format.type.split(";")[0] ?? format.type });
    } finally {
      document.removeEventListener("visibilitychange", handleHidden);
      if (recorder.state !== "inactive") recorder.stop();
      this.#cancel = () => undefined;
    }
  }
}

/** Settles when the show stops: at its end, or when somebody stops it. */
function untilStopped(player: ShowPlayer): Promise<void> {
  return new Promise((resolve, reject) => {
    const stop = player.transport.subscribe(() => {
      if (player.transport.isPlaying) return;
      stop();
      if (player.tick >= player.tempo.endTick - 1) resolve();
      else reject(new RecordingStoppedError("The show was stopped before its end."));
    });
  });
}
