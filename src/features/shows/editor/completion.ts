import {
  autocompletion,
  snippetCompletion,
  type Completion,
  type CompletionContext,
  type CompletionResult,
} from "@codemirror/autocomplete";
import type { Extension } from "@codemirror/state";
import { getMiniFrontPath } from "../stage/mini-front-path.ts";
import { findCompletionPlace, type CompletionPlace } from "./completion-place.ts";
import {
  CODE_SHAPES,
  GLOBAL_WORD_NOTES,
  LIGHTS_WORD_NOTES,
  SECTION_WORDS,
  SONG_WORD_NOTES,
  SQUARE_WORD_NOTES,
  type LanguageWord,
} from "./language-words.ts";
import type { ScriptName, ScriptNames } from "./script-names.ts";

/** A completion that carries the name it stands for, for its picture. */
interface NameCompletion extends Completion {
  readonly scriptName?: ScriptName;
}

/** Offers the language's words and the names of the square and the song, by place. */
export function completeScript(getNames: () => ScriptNames): Extension {
  return autocompletion({
    override: [(context) => complete(context, getNames())],
    icons: false,
    maxRenderedOptions: 60,
    activateOnTypingDelay: 60,
    tooltipClass: () => "script-popup",
    addToOptions: [{ render: (option) => renderPicture(option), position: 10 }],
  });
}

function complete(context: CompletionContext, names: ScriptNames): CompletionResult | null {
  const place = findCompletionPlace(context.state.sliceDoc(0, context.pos));
  if (!place && !context.explicit) return null;
  const at = place ?? ({ kind: "word", from: context.pos } as const);
  return {
    from: at.from,
    options: listOptions(at, names, context),
    validFor: at.kind === "name" ? /^[^"'`]*$/ : /^\w*$/,
  };
}

function listOptions(place: CompletionPlace, names: ScriptNames, context: CompletionContext): Completion[] {
  if (place.kind === "name") return names[place.names].map(toNameCompletion);
  if (place.kind === "word")
    return [...GLOBAL_WORD_NOTES, ...CODE_SHAPES].map(toWordCompletion).concat(listOwnNames(context, place.from));
  if (place.of === "square") return SQUARE_WORD_NOTES.map(toWordCompletion);
  if (place.of === "song") return SONG_WORD_NOTES.map(toWordCompletion);
  if (place.of === "section")
    return SONG_WORD_NOTES.filter(({ word }) => SECTION_WORDS.includes(word)).map(toWordCompletion);
  return LIGHTS_WORD_NOTES.map(toWordCompletion);
}

function toWordCompletion({ word, usage, meaning, snippet }: LanguageWord): Completion {
  const option: Completion = { label: word, displayLabel: usage, detail: meaning };
  return snippet ? snippetCompletion(snippet, option) : option;
}

function toNameCompletion(scriptName: ScriptName): NameCompletion {
  return { label: scriptName.name, detail: scriptName.note, scriptName };
}

/** Names that the script gave itself: variables, functions, parameters. */
function listOwnNames(context: CompletionContext, from: number): Completion[] {
  const text = context.state.doc.toString();
  const own = new Set<string>();
  for (const match of text.matchAll(/\b(?:const|let|function)\s+([A-Za-z_]\w*)|\(?\b([A-Za-z_]\w*)\)?\s*=>/g)) {
    const name = match[1] ?? match[2];
    if (name && match.index < from) own.add(name);
  }
  return [...own].map((label) => ({ label, detail: "yours", boost: 1 }));
}

const SVG = "http://www.w3.org/2000/svg";
const PICTURE_SIZE = 26;

function renderPicture({ scriptName }: NameCompletion): Node | null {
  if (scriptName?.swatch) {
    const swatch = document.createElement("span");
    swatch.className = "script-popup-swatch";
    swatch.style.backgroundColor = scriptName.swatch;
    return swatch;
  }
  if (!scriptName?.silhouette) return null;
  const picture = document.createElementNS(SVG, "svg");
  picture.setAttribute("viewBox", `0 0 ${PICTURE_SIZE} ${PICTURE_SIZE}`);
  picture.setAttribute("class", "mini-front");
  picture.setAttribute("aria-hidden", "true");
  const { wall, openings } = getMiniFrontPath(scriptName.silhouette, PICTURE_SIZE);
  for (const [d, name] of [
    [wall, "mini-front-wall"],
    [openings, "mini-front-openings"],
  ] as const) {
    const path = document.createElementNS(SVG, "path");
    path.setAttribute("d", d);
    path.setAttribute("class", name);
    picture.append(path);
  }
  return picture;
}
