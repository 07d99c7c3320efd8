import type { LessonInput } from "./schema.ts";

const HOOT = 'function hoot() {\n  square.front("chapel").pulse(2);\n  wait(4);\n}\n\nhoot();\nhoot();\nhoot();\n';
const WALK =
  'function walk(side, colour) {\n  for (const front of square.side(side)) {\n    front.pulse(2, colour);\n    wait(1);\n  }\n}\n\nwalk("north", "gold");\nwalk("south", "tomato");\n';

/** Lesson 7: functions of one's own, with parameters, and actions that are handed over. */
export const FUNCTIONS: LessonInput = {
  id: "functions",
  version: 1,
  number: 7,
  title: "Words of your own",
  summary: "Give a name to some lines, hand over values, and run them as often as you like.",
  words: ["repeat", "inTurn", "reversed"],
  typescript: ["function", "parameters", "() =>"],
  minutes: 40,
  songId: "jingle-bells",
  seed: 7,
  steps: [
    {
      id: "when-does-it-run",
      kind: "predict",
      title: "A new word: hoot",
      text: [
        "`function hoot() { ... }` makes a new word. It says what `hoot` means. It does not do it yet.",
        "`hoot();` does it. The brackets mean: run it now.",
      ],
      starter: HOOT,
      question: {
        ask: "At which beats does the chapel pulse?",
        choices: [
          { text: "At beat 0 only", isRight: false, answer: "The word is used three times, and each time it pulses." },
          { text: "At beats 0, 4 and 8", isRight: true, answer: "Yes. Each hoot is a pulse and 4 beats of waiting." },
          {
            text: "At beats 0, 4, 8 and 12",
            isRight: false,
            answer: "Count the lines that say `hoot();`. The first one with `function` only makes the word.",
          },
        ],
      },
    },
    {
      id: "hear-it",
      kind: "run",
      title: "Run the hoots",
      text: ["Run it. While it plays, two lines glow: the one inside the function and the one that called it."],
      starter: HOOT,
      checks: [
        {
          id: "third",
          kind: "lit",
          lights: { front: "chapel" },
          atBeat: 8.5,
          text: "The chapel pulses at beat 8.",
          hint: "Put the starter back and run it.",
        },
        {
          id: "no-fourth",
          kind: "dark",
          lights: { front: "chapel" },
          atBeat: 12.5,
          text: "There is no fourth pulse.",
          hint: "Put the starter back and run it.",
        },
      ],
      solution: HOOT,
    },
    {
      id: "named-not-run",
      kind: "investigate",
      title: "Named, or run?",
      text: ["This script will not run. Read its message.", "Then look at line 6 and line 7. They look nearly alike."],
      starter: 'function hoot() {\n  square.front("chapel").pulse(2);\n  wait(4);\n}\n\nhoot();\nhoot;\n',
      question: {
        ask: "What is missing in line 7?",
        choices: [
          { text: "The brackets", isRight: true, answer: "Yes. `hoot` is only the name. `hoot()` runs it." },
          {
            text: "The word `function`",
            isRight: false,
            answer: "That word makes a function. Here we want to use one.",
          },
          { text: "A number", isRight: false, answer: "This function needs no number. Its brackets stay empty." },
        ],
      },
    },
    {
      id: "say-it-once",
      kind: "change",
      title: "Say it once",
      text: [
        "The same three lines stand there three times. Make a function named `blink` of them, and call it three times.",
        "The ribbon should stay just as it is.",
      ],
      starter:
        'square.front("library").on();\nwait(1);\nsquare.front("library").off();\nwait(3);\nsquare.front("library").on();\nwait(1);\nsquare.front("library").off();\nwait(3);\nsquare.front("library").on();\nwait(1);\nsquare.front("library").off();\n',
      aim: 'function blink() {\n  square.front("library").on();\n  wait(1);\n  square.front("library").off();\n  wait(3);\n}\nblink();\nblink();\nblink();\n',
      checks: [
        {
          id: "function",
          kind: "uses",
          what: "function",
          text: "The script has a function.",
          hint: "Begin with `function blink() {` and end it with `}`.",
        },
        {
          id: "once",
          kind: "quoted",
          quoted: "library",
          atLeast: 1,
          atMost: 2,
          text: "The name of the library stands there two times at most.",
          hint: "Move the lines into the function and take the copies out.",
        },
        {
          id: "three-blinks",
          kind: "cue-count",
          action: "on",
          atLeast: 3,
          atMost: 3,
          text: "The library still comes on three times.",
          hint: "Write `blink();` three times, or use `repeat(3, blink);`.",
        },
        {
          id: "like-the-aim",
          kind: "same-as-aim",
          text: "Your ribbon looks as it did before.",
          hint: "Keep the waits of 1 and 3 beats.",
        },
      ],
      solution:
        'function blink() {\n  square.front("library").on();\n  wait(1);\n  square.front("library").off();\n  wait(3);\n}\nrepeat(3, blink);\n',
    },
    {
      id: "hand-it-over",
      kind: "change",
      title: "Hand it over",
      text: [
        "This function always walks along the north side in gold. Give it two parameters: `side` and `colour`.",
        "Then call it two times: along the north in gold, and then along the south in tomato.",
      ],
      starter:
        'function walk() {\n  for (const front of square.side("north")) {\n    front.pulse(2, "gold");\n    wait(1);\n  }\n}\n\nwalk();\n',
      aim: WALK,
      checks: [
        {
          id: "south",
          kind: "colour",
          lights: { front: "corner cafe" },
          atBeat: 15.5,
          colour: "tomato",
          text: "The corner cafe pulses in tomato at beat 15.",
          hint: 'Write `walk("south", "tomato");` as the second call.',
        },
        {
          id: "north",
          kind: "colour",
          lights: { front: "bookshop" },
          atBeat: 1.5,
          colour: "gold",
          text: "The bookshop pulses in gold at beat 1.",
          hint: 'The first call is `walk("north", "gold");`.',
        },
        {
          id: "one-loop",
          kind: "uses",
          what: "for-of",
          text: "The walk is written as a loop.",
          hint: "Keep the loop inside the function.",
        },
        {
          id: "one-pulse",
          kind: "word",
          word: "pulse",
          atLeast: 1,
          atMost: 1,
          text: "`pulse` is written only once.",
          hint: "Use the parameters in the line instead of a copy.",
        },
        {
          id: "like-the-aim",
          kind: "same-as-aim",
          text: "Your ribbon looks like the aim.",
          hint: "The south begins when the north is done.",
        },
      ],
      solution: WALK,
    },
    {
      id: "there-and-back",
      kind: "change",
      title: "There and back",
      text: [
        "`east.inTurn(1, (front) => front.pulse(3))` gives each front its turn, 1 beat after the one before. The clock stays where it was.",
        "`reversed()` is the same list from the other end. Let the light walk there, and then back.",
      ],
      starter:
        'const east = square.side("east");\neast.inTurn(1, (front) => front.pulse(3));\nwait(10);\neast.inTurn(1, (front) => front.pulse(3));\nwait(10);\n',
      aim: 'const east = square.side("east");\neast.inTurn(1, (front) => front.pulse(3));\nwait(10);\neast.reversed().inTurn(1, (front) => front.pulse(3));\nwait(10);\n',
      checks: [
        {
          id: "back",
          kind: "lit",
          lights: { front: "pottery" },
          atBeat: 10.5,
          text: "The pottery, the last front, begins the way back at beat 10.",
          hint: "Write `east.reversed().inTurn(...)` in line 4.",
        },
        {
          id: "home",
          kind: "lit",
          lights: { front: "apothecary" },
          atBeat: 19.5,
          text: "The apothecary is the last one on the way back.",
          hint: "Leave line 2 as it is.",
        },
        {
          id: "like-the-aim",
          kind: "same-as-aim",
          text: "Your ribbon looks like the aim.",
          hint: "Only one of the two walks is turned round.",
        },
      ],
      solution:
        'const east = square.side("east");\neast.inTurn(1, (front) => front.pulse(3));\nwait(10);\neast.reversed().inTurn(1, (front) => front.pulse(3));\nwait(10);\n',
    },
    {
      id: "your-words",
      kind: "make",
      title: "Two words of your own",
      text: [
        "Make two functions. At least one of them should have a parameter. Call each at least two times.",
        "Good names say what people will see: `wave`, `sparkle`, `goodNight`.",
        "Your show should last for 40 beats or more and end in the dark.",
      ],
      starter: "// My words\nfunction wave(colour) {\n}\n",
      checks: [
        {
          id: "two-functions",
          kind: "uses",
          what: "function",
          atLeast: 2,
          text: "The script has at least two functions.",
          hint: "Write a second `function` below the first.",
        },
        {
          id: "fronts",
          kind: "fronts-lit",
          atLeast: 10,
          text: "At least ten fronts light up.",
          hint: "Use a side, or all of `square.fronts`, in a function.",
        },
        {
          id: "long-enough",
          kind: "lasts-until",
          beat: 40,
          text: "Something still changes at beat 40 or later.",
          hint: "Call your functions more often, or wait longer.",
        },
        {
          id: "dark-end",
          kind: "dark-at-the-end",
          text: "All is dark at the end.",
          hint: "End with `square.all.fadeTo(0, 4);`.",
        },
      ],
      solution:
        '// My words\nfunction wave(colour) {\n  square.side("north").inTurn(1, (front) => front.pulse(3, colour));\n  wait(10);\n}\n\nfunction goodNight(beats) {\n  square.all.fadeTo(0, beats);\n  wait(beats);\n}\n\nwave("gold");\nwave("tomato");\nsquare.side("south").fadeTo(60, 4);\nwait(8);\ngoodNight(4);\nwave("skyblue");\ngoodNight(8);\n',
    },
  ],
  teacherNotes: [
    "Plan for 40 minutes: 4 to teach each other a made-up word; 7 for predict and run; 5 to investigate; 16 for the three changes; 6 for their own words; 2 to share names.",
    "Begin with a made-up word: `frim` means stand up, turn round, sit down. Saying what it means moves nobody. Calling it does. Then give it a number: `frim` three times.",
    "Watch for a function that is made and never called. The stage stays dark, and nothing is wrong with the lines inside.",
    "Watch for a name without brackets. The message says that it was named and not run. In `repeat(3, blink)` the name without brackets is right: it is handed over, and `repeat` runs it.",
    "Watch for parameters that are made and not used. The words inside the function must be the parameter, not the old text in quotes.",
    "Good questions: Which lines does this call run? What is `colour` in the second call? What would you call this function so that nobody has to read its lines?",
    "Done early: a function that calls the other function, or a parameter with a number in it that changes from call to call.",
  ],
};
