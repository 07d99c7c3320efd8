/** One word of the language as completion and the names tab show it. */
export interface LanguageWord {
  readonly word: string;
  /** What to write, with its parameters. */
  readonly usage: string;
  /** What it does, in 12 words or fewer. */
  readonly meaning: string;
  /** Snippet: `${...}` are places to fill in. Left out: the word itself. */
  readonly snippet?: string;
}

const word = (name: string, usage: string, meaning: string, snippet?: string): LanguageWord => ({
  word: name,
  usage,
  meaning,
  snippet,
});

export const GLOBAL_WORD_NOTES: readonly LanguageWord[] = [
  word("square", "square", "The square: all fronts and lights."),
  word("song", "song", "The song: bars, sections, hits and notes."),
  word("wait", "wait(beats)", "Lets beats pass.", "wait(${1});"),
  word("waitUntil", "waitUntil(moment)", "Goes on to a later place in the song.", "waitUntil(${moment});"),
  word("now", "now()", "Where the clock is, in beats.", "now()"),
  word("at", "at(when, action)", "Runs it at a moment, or at each of a list.", "at(${when}, () => {\n\t${}\n});"),
  word("together", "together(...actions)", "Starts all of them now.", "together(\n\t() => {${}},\n\t() => {},\n);"),
  word("repeat", "repeat(times, action)", "Runs it again and again.", "repeat(${4}, () => {\n\t${}\n});"),
  word("beatsIn", "beatsIn(seconds)", "How many beats that is, from now.", "beatsIn(${1})"),
  word("hue", "hue(degrees)", "A colour of the rainbow, 0 to 360.", "hue(${120})"),
  word("roll", "roll(sides)", "A number from 1 up, as a die gives it.", "roll(${6})"),
  word("chance", "chance(percent)", "True that often.", "chance(${50})"),
  word("oneOf", "oneOf(list)", "One of a list, by luck.", "oneOf(${list})"),
  word("console.log", "console.log(value)", "Writes a note. Nothing lights up.", "console.log(${value});"),
];

export const SQUARE_WORD_NOTES: readonly LanguageWord[] = [
  word("all", "square.all", "Every single light."),
  word("fronts", "square.fronts", "All fronts in walking order, the tree last."),
  word("front", 'square.front("name")', "One front.", 'front("${}")'),
  word("side", 'square.side("north")', "The fronts of one side.", 'side("${}")'),
  word("parts", 'square.parts("windows")', "That part of each front that has it.", 'parts("${}")'),
];

export const SONG_WORD_NOTES: readonly LanguageWord[] = [
  word("start", "start", "The moment it begins."),
  word("end", "end", "The moment it ends."),
  word("bars", "bars", "The moments where bars begin."),
  word("beats", "beats", "The moments of all beats."),
  word("beatsPerBar", "song.beatsPerBar", "How many beats a bar has."),
  word("bar", "song.bar(number, beat)", "The moment of a bar, or of a beat in it.", "bar(${1})"),
  word("section", 'song.section("chorus")', "One section of the song.", 'section("${}")'),
  word("sections", "song.sections", "All sections in order."),
  word("hits", 'song.hits("drums")', "The moments at which it plays.", 'hits("${}")'),
  word("notes", 'song.notes("bells")', "Its notes: start, beats and pitch.", 'notes("${}")'),
  word("howLoud", "song.howLoud(moment)", "How loud it is there, 0 to 100.", "howLoud(${moment})"),
];

export const SECTION_WORDS: readonly string[] = ["start", "end", "bars", "beats"];

export const LIGHTS_WORD_NOTES: readonly LanguageWord[] = [
  word("on", "on(level)", "Lights them, up to the level.", "on(${100})"),
  word("off", "off()", "Puts them out.", "off()"),
  word("fadeTo", "fadeTo(level, beats)", "Fades them to a level.", "fadeTo(${90}, ${2})"),
  word("pulse", "pulse(beats, colour)", "A flash on top that dies away.", "pulse(${1})"),
  word("colour", "colour(colour, beats)", "Gives them a colour.", 'colour("${}")'),
  word("part", 'part("door")', "One part of a front.", 'part("${}")'),
  word("first", "first(n)", "The first n of them.", "first(${3})"),
  word("everyNth", "everyNth(n, from)", "Each second, each third, and so on.", "everyNth(${2})"),
  word("reversed", "reversed()", "The same, backwards.", "reversed()"),
  word("shuffled", "shuffled()", "The same, in any order.", "shuffled()"),
  word("split", "split(groups)", "Cuts them into groups, one after the other.", "split(${2})"),
  word("and", "and(other)", "These and those.", "and(${other})"),
  word("except", "except(other)", "These without those.", "except(${other})"),
  word("lights", "lights", "Each single light of them."),
  word(
    "inTurn",
    "inTurn(step, action)",
    "Runs it for each, a step apart.",
    "inTurn(${0.5}, light => ${light.pulse(1)});",
  ),
  word("name", "name", "What it is called."),
  word("box", "box", "The kind of box it hangs on."),
  word("length", "length", "How many there are."),
  word("forEach", "forEach(action)", "Runs it for each of them.", "forEach(light => ${light.on()});"),
  word("filter", "filter(test)", "Those that pass the test.", 'filter(light => ${light.box !== "relay"})'),
  word("map", "map(change)", "A list made from each of them.", "map(light => ${light.name})"),
];

/** Shapes of code that beginners use again and again. */
export const CODE_SHAPES: readonly LanguageWord[] = [
  word(
    "for of",
    "for (const front of square.fronts)",
    "Does it for each of a list.",
    "for (const ${front} of ${square.fronts}) {\n\t${}\n}",
  ),
  word(
    "for count",
    "for (let turn = 0; turn < 4; turn += 1)",
    "Does it a number of times.",
    "for (let ${turn} = 0; ${turn} < ${4}; ${turn} += 1) {\n\t${}\n}",
  ),
  word("if", "if (test)", "Does it only when the test is true.", "if (${test}) {\n\t${}\n}"),
  word("function", "function name()", "Gives steps a name.", "function ${name}(${}) {\n\t${}\n}"),
  word("const", "const name = value;", "Gives a value a name.", "const ${name} = ${value};"),
  word("let", "let name = value;", "A name whose value may change.", "let ${name} = ${value};"),
];
