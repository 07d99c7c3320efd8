import { spawnSync } from "node:child_process";

const APT_COMMAND = "apt-get update && apt-get install -y --no-install-recommends ffmpeg";

/** The program from FFMPEG_PATH or the search path; null when there is none that runs. */
function findFfmpeg(): string | null {
  const named = process.env["FFMPEG_PATH"];
  const program = named === undefined || named === "" ? "ffmpeg" : named;
  return spawnSync(program, ["-version"]).status === 0 ? program : null;
}

/**
 * Gives ffmpeg, whose `photosensitivity` filter is an independent second opinion on flashes; root gets
 * it installed with apt-get. Throws an Error that names the command for everybody else: the check is
 * never skipped.
 */
export function ensureFfmpeg(log: (line: string) => void): string {
  const found = findFfmpeg();
  if (found !== null) return found;
  const needs = "The flash checks need ffmpeg.";
  if (process.getuid?.() !== 0)
    throw new Error(`${needs} Install it first:\n  sudo sh -c "${APT_COMMAND}"\nor set FFMPEG_PATH.`);
  log(`${needs} Installing it with apt-get ...`);
  const installed = spawnSync("sh", ["-c", APT_COMMAND], { encoding: "utf8" });
  const program = findFfmpeg();
  if (program === null) throw new Error(`${needs} This failed:\n  ${APT_COMMAND}\n${installed.stderr}`);
  return program;
}

/** A video as raw frames: three bytes a pixel, red, green and blue. */
export interface RawVideo {
  readonly width: number;
  readonly height: number;
  readonly framesPerSecond: number;
  readonly frames: readonly Uint8Array[];
}

/**
 * Gives the badness that the `photosensitivity` filter works out for each frame (1 is its own limit).
 * Source: FFmpeg, libavfilter/vf_photosensitivity.c: a weighted mean over 30 frames of the changes of
 * the gamma-coded means on a grid of 8 x 8. It is not WCAG: it knows no luminance, floor or pairs.
 */
export function measureBadness(ffmpeg: string, { width, height, framesPerSecond, frames }: RawVideo): number[] {
  const input = ["-f", "rawvideo", "-pix_fmt", "rgb24", "-s", `${width}x${height}`, "-r", String(framesPerSecond)];
  const filter = "photosensitivity=bypass=1,metadata=print:key=lavfi.photosensitivity.badness:file=-";
  const { status, stdout, stderr } = spawnSync(
    ffmpeg,
    ["-hide_banner", "-loglevel", "error", ...input, "-i", "pipe:0", "-vf", filter, "-f", "null", "-"],
    { input: Buffer.concat(frames), encoding: "utf8", maxBuffer: 16 * 1024 * 1024 },
  );
  if (status !== 0) throw new Error(`ffmpeg failed: ${stderr}`);
  const badness = [...stdout.matchAll(/lavfi\.photosensitivity\.badness=([\d.]+)/g)].map(([, value]) => Number(value));
  if (badness.length !== frames.length)
    throw new Error(`ffmpeg judged ${badness.length} of ${frames.length} frames:\n${stdout.slice(0, 500)}`);
  return badness;
}
