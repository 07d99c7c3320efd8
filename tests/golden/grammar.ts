import type { NameTable } from "../../sandbox/language/names.ts";

/**
 * Programs of the show language, drawn at random: right ones, that use every word. Whoever draws
 * decides: a seeded stream for the golden set, fast-check for the properties.
 */

/** A whole number from 0 to below its argument. */
export type Draw = (below: number) => number;

/** What a program may name, and what is in scope where the next statement goes. */
interface Place {
  readonly draw: Draw;
  readonly names: NameTable;
  /** Blocks around it. */
  readonly depth: number;
  readonly numbers: readonly string[];
  readonly lights: readonly string[];
  readonly functions: readonly string[];
  /** Counts names, so that none is made twice. */
  readonly count: { next: number };
}

const MAX_DEPTH = 2;

/** A program of a few statements. */
export function drawProgram(draw: Draw, names: NameTable): string {
  const place: Place = { draw, names, depth: 0, numbers: [], lights: [], functions: [], count: { next: 1 } };
  return block(place, 4 + draw(5), "");
}

const pick = <T>({ draw }: Pick<Place, "draw">, list: readonly T[]): T => list[draw(list.length)] as T;
const quote = (text: string): string => JSON.stringify(text);

function newName({ count }: Place, kind: string): string {
  return `${kind}${count.next++}`;
}

function block(place: Place, statements: number, indent: string): string {
  let inner = place;
  const lines: string[] = [];
  for (let i = 0; i < statements; i++) {
    const { text, after } = statement(inner, indent);
    lines.push(...text.map((line) => indent + line));
    inner = after;
  }
  return lines.join("\n");
}

/** A block one deeper, with more names in scope. */
function body(place: Place, indent: string, more: Partial<Pick<Place, "numbers" | "lights">> = {}): string {
  const inner: Place = {
    ...place,
    depth: place.depth + 1,
    numbers: [...place.numbers, ...(more.numbers ?? [])],
    lights: [...place.lights, ...(more.lights ?? [])],
  };
  const first = more.lights?.[0] === undefined ? "" : `${indent}  ${more.lights[0]}${act(inner)};\n`;
  return `{\n${first}${block(inner, 1 + place.draw(2), `${indent}  `)}\n${indent}}`;
}

interface Written {
  readonly text: readonly string[];
  /** Scope for the next statement of the block. */
  readonly after: Place;
}

type Writer = (place: Place, indent: string) => Written;

const plain =
  (write: (place: Place, indent: string) => string): Writer =>
  (place, indent) => ({ text: [write(place, indent)], after: place });

/** Statements without a block. */
const FLAT: readonly Writer[] = [
  plain((place) => `${lights(place)}${act(place)};`),
  plain((place) => `${lights(place)}${act(place)}${act(place)};`),
  plain((place) => `wait(${beats(place)});`),
  plain((place) => `waitUntil(now() + ${beats(place)});`),
  plain((place) => `wait(beatsIn(${pick(place, ["0.5", "1", "1.25"])}));`),
  plain((place) => `console.log(${pick(place, [number, text, list])(place)});`),
  plain((place) =>
    place.functions.length === 0
      ? "wait(0.25);"
      : `${pick(place, place.functions)}(${lights(place)}, ${level(place)});`,
  ),
  (place) => {
    const name = newName(place, "number");
    return { text: [`const ${name} = ${number(place)};`], after: { ...place, numbers: [...place.numbers, name] } };
  },
  (place) => {
    const name = newName(place, "group");
    return { text: [`const ${name} = ${lights(place)};`], after: { ...place, lights: [...place.lights, name] } };
  },
];

/** Statements around a block. */
const DEEP: readonly Writer[] = [
  plain((place, indent) => `at(${moment(place)}, () => ${body(place, indent)});`),
  plain((place, indent) => {
    const turn = newName(place, "turn");
    return `at(${moments(place)}, (${turn}) => ${body(place, indent, { numbers: [turn] })});`;
  }),
  plain(
    (place, indent) =>
      `together(\n${indent}  () => ${body(place, `${indent}  `)},\n${indent}  () => ${body(place, `${indent}  `)},\n${indent});`,
  ),
  plain((place, indent) => {
    const turn = newName(place, "turn");
    return `repeat(${2 + place.draw(3)}, (${turn}) => ${body(place, indent, { numbers: [turn] })});`;
  }),
  plain((place, indent) => {
    const light = newName(place, "light");
    return `for (const ${light} of ${fewLights(place)}) ${body(place, indent, { lights: [light] })}`;
  }),
  plain((place, indent) => {
    const i = newName(place, "i");
    return `for (let ${i} = 0; ${i} < ${2 + place.draw(3)}; ${i}++) ${body(place, indent, { numbers: [i] })}`;
  }),
  plain((place, indent) => `if (${condition(place)}) ${body(place, indent)} else ${body(place, indent)}`),
  plain((place, indent) => {
    const item = newName(place, "item");
    return `${fewLights(place)}.inTurn(${beats(place)}, (${item}) => ${body(place, indent, { lights: [item] })});`;
  }),
  plain((place, indent) => {
    const item = newName(place, "item");
    return `${fewLights(place)}.forEach((${item}) => ${body(place, indent, { lights: [item] })});`;
  }),
  plain((place, indent) => {
    const left = newName(place, "left");
    return `let ${left} = ${2 + place.draw(3)};\n${indent}while (${left} > 0) {\n${indent}  ${left} = ${left} - 1;\n${indent}  ${lights(place)}${act(place)};\n${indent}  wait(0.5);\n${indent}}`;
  }),
  plain((place, indent) => {
    const note = newName(place, "note");
    return `for (const ${note} of song.notes(${quote(pick(place, place.names.instrument))}, ${section(place)})) {\n${indent}  at(${note}.start, () => ${lights(place)}.pulse(${note}.beats, hue(${note}.pitch * 5)));\n${indent}}`;
  }),
  (place, indent) => {
    const name = newName(place, "act");
    const group = newName(place, "group");
    const high = newName(place, "level");
    const inside = { ...place, functions: [] };
    const text = `function ${name}(${group}: Lights, ${high}: number) ${body(inside, indent, { lights: [group], numbers: [high] })}`;
    return {
      text: [text, `${name}(${lights(place)}, ${level(place)});`],
      after: { ...place, functions: [...place.functions, name] },
    };
  },
];

function statement(place: Place, indent: string): Written {
  return pick(place, place.depth < MAX_DEPTH && place.draw(5) < 3 ? DEEP : FLAT)(place, indent);
}

function beats(place: Place): string {
  return pick(place, ["0.25", "0.5", "1", "1.5", "2", "song.beatsPerBar", "roll(3)"]);
}

function level(place: Place): string {
  return pick(place, ["100", "80", "55", "12.5", "0", "roll(100)", "song.howLoud(now())"]);
}

function colour(place: Place): string {
  const { names } = place;
  return pick(place, [
    () => quote(pick(place, names.colour)),
    () => `hue(${place.draw(360)})`,
    () => quote(`#${place.draw(0x1_00_00_00).toString(16).padStart(6, "0")}`),
    () => `oneOf([${quote(pick(place, names.colour))}, ${quote(pick(place, names.colour))}])`,
  ])();
}

function act(place: Place): string {
  return pick(place, [
    () => ".on()",
    () => `.on(${level(place)})`,
    () => ".off()",
    () => `.fadeTo(${level(place)}, ${beats(place)})`,
    () => `.pulse(${beats(place)})`,
    () => `.pulse(${beats(place)}, ${colour(place)})`,
    () => `.colour(${colour(place)})`,
    () => `.colour(${colour(place)}, ${beats(place)})`,
  ])();
}

function lights(place: Place): string {
  const { names } = place;
  const simple = () =>
    pick(place, [
      () => "square.all",
      () => "square.fronts",
      () => `square.front(${quote(pick(place, names.front))})`,
      () => `square.front(${quote(pick(place, names.front))}).part(${quote(pick(place, names.part))})`,
      () => `square.side(${quote(pick(place, names.side))})`,
      () => `square.parts(${quote(pick(place, names.part))})`,
      () => pick(place, ["square.all", ...place.lights]),
    ])();
  const choose = () =>
    pick(place, [
      () => `.first(${1 + place.draw(4)})`,
      () => `.everyNth(${1 + place.draw(4)})`,
      () => `.everyNth(3, ${place.draw(3)})`,
      () => ".reversed()",
      () => ".shuffled()",
      () => `.split(${1 + place.draw(3)})[0]`,
      () => `.and(${simple()})`,
      () => `.except(${simple()})`,
      () => ".lights",
      () => '.filter((light) => light.box !== "relay")',
      () => '.filter((light) => light.name !== "roof")',
    ])();
  const word = simple();
  return place.draw(2) === 0 ? word : word + choose();
}

/** Lights with so few items that a loop over them stays small. */
function fewLights(place: Place): string {
  return `${lights(place)}.first(${2 + place.draw(4)})`;
}

function section({ draw, names }: Place): string {
  return draw(3) === 0 ? `song.sections[${draw(2)}]` : `song.section(${quote(pick({ draw }, names.section))})`;
}

function moment(place: Place): string {
  return pick(place, [
    () => String(place.draw(100)),
    () => `song.bar(${1 + place.draw(4)})`,
    () => `song.bar(${1 + place.draw(4)}, ${1 + place.draw(2)})`,
    () => `${section(place)}.start`,
    () => `${section(place)}.end - 1`,
    () => "song.end - 4",
    () => `song.start + ${beats(place)}`,
    () => `now() + ${beats(place)}`,
  ])();
}

function moments(place: Place): string {
  const whole = pick(place, [
    () => `${section(place)}.bars`,
    () => `${section(place)}.beats`,
    () => "song.bars",
    () => "song.beats",
    () => `song.hits(${quote(pick(place, place.names.instrument))})`,
    () => `song.hits(${quote(pick(place, place.names.instrument))}, ${section(place)})`,
    () => `[${moment(place)}, ${moment(place)}]`,
  ])();
  return `${whole}.slice(0, ${3 + place.draw(6)})`;
}

function number(place: Place): string {
  return pick(place, [
    () => String(place.draw(100)),
    () => "now()",
    () => "Math.random()",
    () => `${lights(place)}.length`,
    () => `roll(${2 + place.draw(5)}) * 2`,
    () => `Math.round(${pick(place, ["1.5", ...place.numbers])} * 3)`,
    () => `song.sections.length + song.bars.length`,
    () => `${section(place)}.end - ${section(place)}.start`,
  ])();
}

function text(place: Place): string {
  return pick(place, [
    () => `\`beat \${now()}\``,
    () => `${section(place)}.name`,
    () => `${lights(place)}.name + " " + ${lights(place)}.box`,
    () => colour(place),
  ])();
}

function list(place: Place): string {
  return pick(place, [
    () => `${fewLights(place)}.map((light) => light.name).join(", ")`,
    () => `[${number(place)}, ${number(place)}].map((one) => one + 1)`,
  ])();
}

function condition(place: Place): string {
  return pick(place, [
    () => `chance(${place.draw(101)})`,
    () => `${lights(place)}.box === "relay"`,
    () => `now() % 2 === 0`,
    () => `song.howLoud(${moment(place)}) > 50`,
    () => `${pick(place, ["1", ...place.numbers])} < 3 && chance(50)`,
  ])();
}
