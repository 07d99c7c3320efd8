import type { LessonInput } from "./schema.ts";

const THREE_ROUNDS =
  'for (let round = 0; round < 3; round++) {\n  for (const front of square.side("north")) {\n    front.pulse(2, "gold");\n    wait(1);\n  }\n}\n';
const TOGETHER =
  'for (let round = 0; round < 4; round++) {\n  for (const front of square.side("west")) {\n    front.pulse(4, "teal");\n  }\n  wait(8);\n}\n';

/** Lesson 5: a loop in a loop, parts of fronts, and every so many. */
export const LOOPS_IN_LOOPS: LessonInput = {
  id: "loops-in-loops",
  version: 1,
  number: 5,
  title: "A loop in a loop",
  summary: "Go round more than once, and light only windows, only doors, or every second front.",
  words: ["parts", "part", "everyNth"],
  typescript: ["a loop in a loop", "%"],
  minutes: 40,
  songId: "quillhaven-bells",
  seed: 5,
  steps: [
    {
      id: "how-many",
      kind: "predict",
      title: "Three times ten",
      text: [
        "The outer loop counts rounds. In every round the inner loop goes along all ten fronts of the north side.",
      ],
      starter: THREE_ROUNDS,
      question: {
        ask: "How many pulses are there in all?",
        choices: [
          { text: "3", isRight: false, answer: "There are 3 rounds, but each round has many pulses." },
          { text: "10", isRight: false, answer: "That is one round. The outer loop runs it again." },
          { text: "13", isRight: false, answer: "Do not add. Each of the 3 rounds has all 10." },
          { text: "30", isRight: true, answer: "Yes. 3 rounds with 10 pulses each." },
        ],
      },
    },
    {
      id: "see-three",
      kind: "run",
      title: "See the rounds",
      text: ["Run it and look at the ribbon. Where does a new round begin?"],
      starter: THREE_ROUNDS,
      checks: [
        {
          id: "thirty",
          kind: "cue-count",
          action: "pulse",
          atLeast: 30,
          atMost: 30,
          text: "There are 30 pulses.",
          hint: "Put the starter back and run it.",
        },
        {
          id: "second-round",
          kind: "lit",
          lights: { front: "bakery" },
          atBeat: 10.5,
          text: "The bakery pulses again at beat 10.",
          hint: "Put the starter back and run it.",
        },
      ],
      solution: THREE_ROUNDS,
    },
    {
      id: "every-third",
      kind: "investigate",
      title: "Every third front",
      text: [
        "`everyNth(3)` takes the first front, leaves two out, takes the next one, and so on.",
        "The north side has ten fronts.",
      ],
      starter: 'square.side("north").everyNth(3).on();\n',
      question: {
        ask: "How many fronts light up?",
        choices: [
          { text: "3", isRight: false, answer: "Count along: fronts 1, 4, 7 and one more." },
          { text: "4", isRight: true, answer: "Yes. It is fronts 1, 4, 7 and 10." },
          { text: "7", isRight: false, answer: "Those are the ones that stay dark, and one more." },
        ],
      },
    },
    {
      id: "only-windows",
      kind: "change",
      title: "Only the windows",
      text: [
        'A front has parts, such as roof, windows and door. `front.part("windows")` is just the windows.',
        "Change the script so that only the windows come on, one front after the other.",
      ],
      starter: 'for (const front of square.side("north")) {\n  front.on();\n  wait(2);\n}\n',
      aim: 'for (const front of square.side("north")) {\n  front.part("windows").on();\n  wait(2);\n}\n',
      checks: [
        {
          id: "windows",
          kind: "lit",
          lights: { side: "north", part: "windows" },
          atBeat: 19,
          text: "All windows of the north side are lit at beat 19.",
          hint: 'Write `front.part("windows").on();`.',
        },
        {
          id: "no-roof",
          kind: "dark",
          lights: { side: "north", part: "roof" },
          atBeat: 19,
          text: "The roofs of the north side stay dark.",
          hint: "The whole front still comes on. Name the part.",
        },
        {
          id: "in-turn",
          kind: "order",
          fronts: ["bakery", "library", "cinema"],
          text: "The fronts take turns.",
          hint: "Keep the loop and its `wait`.",
        },
      ],
      solution: 'for (const front of square.side("north")) {\n  front.part("windows").on();\n  wait(2);\n}\n',
    },
    {
      id: "to-and-fro",
      kind: "change",
      title: "To and fro",
      text: [
        "`everyNth(2, 0)` starts with the first front, `everyNth(2, 1)` with the second.",
        "`round % 2` is what is left when you share `round` by 2: 0, 1, 0, 1 and so on.",
        "Let the two halves take turns.",
      ],
      starter:
        'for (let round = 0; round < 8; round++) {\n  square.side("east").everyNth(2, 0).pulse(4, "orchid");\n  wait(4);\n}\n',
      aim: 'for (let round = 0; round < 8; round++) {\n  square.side("east").everyNth(2, round % 2).pulse(4, "orchid");\n  wait(4);\n}\n',
      checks: [
        {
          id: "grocer",
          kind: "lit",
          lights: { front: "grocer" },
          atBeat: 5,
          text: "The grocer, the second front, is lit at beat 5.",
          hint: "Put `round % 2` where the 0 is.",
        },
        {
          id: "apothecary",
          kind: "dark",
          lights: { front: "apothecary" },
          atBeat: 5,
          text: "The apothecary, the first one, is dark at beat 5.",
          hint: "Each half has a turn of its own.",
        },
        {
          id: "like-the-aim",
          kind: "same-as-aim",
          text: "Your ribbon looks like the aim.",
          hint: "Keep the eight rounds and the 4 beats.",
        },
      ],
      solution:
        'for (let round = 0; round < 8; round++) {\n  square.side("east").everyNth(2, round % 2).pulse(4, "orchid");\n  wait(4);\n}\n',
    },
    {
      id: "all-at-once",
      kind: "change",
      title: "All at once, four times",
      text: [
        "In each round all ten fronts should pulse together. Then there are 8 beats of waiting, and the next round begins.",
        "Move one line.",
      ],
      starter:
        'for (let round = 0; round < 4; round++) {\n  for (const front of square.side("west")) {\n    front.pulse(4, "teal");\n    wait(8);\n  }\n}\n',
      aim: TOGETHER,
      checks: [
        {
          id: "together",
          kind: "lit",
          lights: { side: "west" },
          atBeat: 1,
          text: "The whole west side is lit at beat 1.",
          hint: "Move the `wait` out of the inner loop.",
        },
        {
          id: "again",
          kind: "lit",
          lights: { side: "west" },
          atBeat: 25,
          text: "It is lit again at beat 25.",
          hint: "Keep the `wait` inside the outer loop.",
        },
        {
          id: "nested",
          kind: "uses",
          what: "nested-loop",
          text: "There is a loop in a loop.",
          hint: "Keep both loops.",
        },
        {
          id: "like-the-aim",
          kind: "same-as-aim",
          text: "Your ribbon looks like the aim.",
          hint: "The `wait` belongs after the first `}`.",
        },
      ],
      solution: TOGETHER,
    },
    {
      id: "your-pattern",
      kind: "make",
      title: "A pattern of your own",
      text: [
        "Make a pattern with a loop in a loop. Use `everyNth` or a part, such as the roof or the windows.",
        "At least 20 fronts should take part. It should last for 32 beats or more.",
        "Draw your ribbon on paper first. Does it come out like that?",
      ],
      starter: "// My pattern\nfor (let round = 0; round < 4; round++) {\n}\n",
      checks: [
        {
          id: "nested",
          kind: "uses",
          what: "nested-loop",
          text: "There is a loop in a loop.",
          hint: "Put a `for..of` loop inside the counting loop.",
        },
        {
          id: "fronts",
          kind: "fronts-lit",
          atLeast: 20,
          text: "At least 20 fronts light up.",
          hint: "Use more than one side, or all of `square.fronts`.",
        },
        {
          id: "not-all-at-once",
          kind: "word",
          word: "wait",
          atLeast: 1,
          text: "The script waits.",
          hint: "Without a `wait` all rounds happen at beat 0.",
        },
        {
          id: "long-enough",
          kind: "lasts-until",
          beat: 32,
          text: "Something still changes at beat 32 or later.",
          hint: "More rounds or longer waits make it longer.",
        },
      ],
      solution:
        '// My pattern\nfor (let round = 0; round < 4; round++) {\n  for (const front of square.fronts.everyNth(2, round % 2)) {\n    front.part("windows").pulse(3, "gold");\n    wait(0.5);\n  }\n  wait(2);\n}\n',
    },
  ],
  teacherNotes: [
    "Plan for 40 minutes: 5 to act out two loops; 7 for predict and run; 5 to investigate; 15 for the three changes; 6 for their own pattern; 2 to look at ribbons.",
    "Act it out: one learner is the outer loop and holds up the number of the round. Another is the inner loop and walks along the row. The outer number changes only when the walk is over.",
    "Watch for the place of the `wait`. Inside the inner loop it spreads the fronts out. In the outer loop only, it spreads the rounds out. Both can be right. Ask which one was meant.",
    "Watch for the sum of rounds and fronts where a product is right: 3 rounds of 10 are 30.",
    "`round % 2` is new to most. Let them write down 0 to 7 and what is left after sharing by 2.",
    "Good questions: Which loop does this line belong to? How often does it run? What would the ribbon look like with the line one brace further out?",
    "Done early: try `everyNth(3, round % 3)`, or a third loop inside the second.",
  ],
};
