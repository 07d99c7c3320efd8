import { Icon } from "../../components/icon.tsx";
import { ICON_NAMES } from "../../components/icon-paths.ts";
import { GallerySection } from "./gallery-section.tsx";

const SWATCHES = [
  ["bg-paper", "paper"],
  ["bg-card", "card"],
  ["bg-well", "well"],
  ["bg-mount", "mount"],
  ["bg-ink", "ink"],
  ["bg-soft", "soft"],
  ["bg-slate", "slate"],
  ["bg-line", "line"],
  ["bg-rim", "rim"],
  ["bg-dusk", "dusk"],
  ["bg-twilight", "twilight"],
  ["bg-lamp", "lamp"],
  ["bg-lamp-ink", "lamp-ink"],
  ["bg-lamp-tint", "lamp-tint"],
  ["bg-glow", "glow"],
  ["bg-spruce", "spruce"],
  ["bg-spruce-tint", "spruce-tint"],
  ["bg-rowan", "rowan"],
  ["bg-rowan-tint", "rowan-tint"],
  ["bg-plum", "plum"],
  ["bg-blue-ink", "blue-ink"],
  ["bg-blue-tint", "blue-tint"],
] as const;

/** Colours, type and icons. */
export function Colours() {
  return (
    <>
      <GallerySection title="Colours">
        <ul className="grid grid-cols-[repeat(auto-fill,minmax(7rem,1fr))] gap-3">
          {SWATCHES.map(([className, name]) => (
            <li key={name} className="text-meta">
              <span className={`block h-12 rounded-cut border border-line ${className}`} />
              {name}
            </li>
          ))}
        </ul>
      </GallerySection>
      <GallerySection title="Type">
        <p className="font-head text-8 leading-tight font-[650]">Write the lights for the town square</p>
        <p className="font-head text-7 font-[650]">Taking turns</p>
        <h3>A show with a chorus</h3>
        <p>
          Body text, with <a href="#type">a link</a>, <strong>strong words</strong>, <em>a stressed one</em> and{" "}
          <code className="rounded-[2px] bg-well px-1 font-mono">wait(0.5)</code>. Łukasz, Åsa and Zoë read well.
        </p>
        <p className="text-meta text-slate">Meta text in slate: saved 4 minutes ago · 2:24</p>
        <pre className="rounded-sheet whitespace-pre-wrap border border-line bg-card p-3 font-mono text-3">
          <span className="text-syntax-keyword">for</span> <span className="text-syntax-punctuation">(</span>
          <span className="text-syntax-keyword">const</span> front <span className="text-syntax-keyword">of</span>{" "}
          <span className="text-syntax-object">square</span>.<span className="text-syntax-call">side</span>(
          <span className="text-syntax-string">&quot;north&quot;</span>)) wait(
          <span className="text-syntax-number">0.5</span>){" "}
          <span className="text-syntax-comment">{"// one after another"}</span>
        </pre>
      </GallerySection>
      <GallerySection title="Icons">
        <ul className="grid grid-cols-[repeat(auto-fill,minmax(8.5rem,1fr))] gap-x-3 gap-y-2 text-meta">
          {ICON_NAMES.map((name) => (
            <li key={name} className="flex items-center gap-2">
              <Icon name={name} className="size-6" />
              {name}
            </li>
          ))}
        </ul>
      </GallerySection>
    </>
  );
}
