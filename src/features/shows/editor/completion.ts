import {
  autocompletion,
  snippetCompletion,
  type Completion,
  type CompletionContext,
  type CompletionResult,
} from "@codemirror/autocomplete";
import type { Extension } from "@codemirror/state";
import { getMiniFrontPath } from "../stage/mini-front-path.ts";
import type { Offer } from "../../../../sandbox/language/assist.ts";
import { findWord, listWordsOf, REFERENCE, wordId } from "../../../../sandbox/language/reference/index.ts";
import { CODE_SHAPES, type Shape } from "./code-shapes.ts";
import { findCompletionPlace, type CompletionPlace } from "./completion-place.ts";
import type { LanguageClient } from "./language-client.ts";
import type { ScriptName, ScriptNames } from "./script-names.ts";

/** A completion that carries the name it stands for, for its picture. */
interface NameCompletion extends Completion {
  readonly scriptName?: ScriptName;
}

/** The checker loads while the first words are typed; nobody waits for it that long. */
const PATIENCE_MS = 300;

/**
 * Offers the language's words, the names of the square and the song, and the script's own names, by
 * place: as the type checker sees it, or by the look of the line until it has answered.
 */
export function completeScript(getNames: () => ScriptNames, client: LanguageClient): Extension {
  return autocompletion({
    override: [(context) => complete(context, getNames(), client)],
    icons: false,
    maxRenderedOptions: 60,
    activateOnTypingDelay: 60,
    tooltipClass: () => "script-popup",
    addToOptions: [{ render: (option) => renderPicture(option), position: 10 }],
  });
}

async function complete(
  context: CompletionContext,
  names: ScriptNames,
  client: LanguageClient,
): Promise<CompletionResult | null> {
  const place = findCompletionPlace(context.state.sliceDoc(0, context.pos));
  if (!place && !context.explicit) return null;
  const at = place ?? ({ kind: "word", from: context.pos } as const);
  const offers = await Promise.race([
    client.ask("listOffers", context.state.doc.toString(), context.pos),
    new Promise<null>((resolve) => setTimeout(resolve, PATIENCE_MS, null)),
  ]);
  return {
    from: at.from,
    options: offers && offers.length > 0 ? toOptions(offers, at, names) : listOptions(at, names, context),
    validFor: at.kind === "name" ? /^[^"'`]*$/ : /^\w*$/,
  };
}

/** The checker's offers; shapes of code where a statement may begin. */
function toOptions(offers: readonly Offer[], place: CompletionPlace, names: ScriptNames): Completion[] {
  const known = new Map(Object.values(names).flatMap((list) => list.map((one) => [one.name, one] as const)));
  const options = offers.map((offer): Completion => {
    const entry = offer.wordId === null ? undefined : WORDS.get(offer.wordId);
    if (entry) return toWordCompletion(entry);
    if (offer.kind === "name") return toNameCompletion(known.get(offer.name) ?? { name: offer.name, note: "" });
    return offer.kind === "own" ? { label: offer.name, detail: "yours", boost: 1 } : { label: offer.name };
  });
  return place.kind === "word" ? [...options, ...WRITES, ...CODE_SHAPES.map(toWordCompletion)] : options;
}

function listOptions(place: CompletionPlace, names: ScriptNames, context: CompletionContext): Completion[] {
  if (place.kind === "name") return names[place.names].map(toNameCompletion);
  if (place.kind === "member") return listWordsOf(place.of).map(toWordCompletion);
  return [
    ...[...listWordsOf("script"), ...CODE_SHAPES].map(toWordCompletion),
    ...WRITES,
    ...listOwnNames(context, place.from),
  ];
}

function toWordCompletion({ word, usage, meaning, snippet }: Shape): Completion {
  const option: Completion = { label: word, displayLabel: usage, detail: meaning };
  return snippet ? snippetCompletion(snippet, option) : option;
}

const WORDS = new Map(REFERENCE.map((entry) => [wordId(entry), entry]));
const LOG = findWord("console", "log");
/** `console.log` is one word to its writers. */
const WRITES: readonly Completion[] = LOG ? [toWordCompletion({ ...LOG, word: "console.log" })] : [];

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
