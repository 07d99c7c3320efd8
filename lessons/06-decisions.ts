import type { LessonInput } from "./schema.ts";

const BY_BOX =
  'for (const front of square.side("north")) {\n  if (front.box === "relay") {\n    front.on();\n  } else {\n    front.pulse(2);\n  }\n  wait(1);\n}\n';
const EVERY_THIRD =
  'for (let turn = 0; turn < 12; turn++) {\n  if (turn % 3 === 0) {\n    square.front("bookshop").pulse(2, "tomato");\n  } else {\n    square.front("bookshop").pulse(2, "gold");\n  }\n  wait(2);\n}\n';

/** Lesson 6: conditions and chance. */
export const DECISIONS: LessonInput = {
  id: "decisions",
  version: 1,
  number: 6,
  title: "If this, else that",
  summary: "Let the script decide: by the kind of box, by the turn, by the time, or by luck.",
  words: ["box", "now", "chance", "roll"],
  typescript: ["if", "else", "===", "&&"],
  minutes: 40,
  songId: "frost-fair",
  seed: 6,
  steps: [
    {
      id: "who-stays",
      kind: "predict",
      title: "Who stays lit?",
      text: [
        'Every front has a box that feeds its lights. `front.box` is the kind of box: `"relay"`, `"solid-state"`, `"dimmer"`, `"colour"` or `"mixed"`.',
        "`===` asks if two things are the same. If the answer is yes, the first lines run. If not, the lines after `else` run.",
      ],
      starter: BY_BOX,
      question: {
        ask: "Which fronts are still lit at beat 15?",
        choices: [
          { text: "All ten", isRight: false, answer: "A pulse dies away after 2 beats. Only `on` stays." },
          {
            text: "Those with a relay box",
            isRight: true,
            answer: "Yes. They are turned on, and nothing turns them off.",
          },
          { text: "Those without a relay box", isRight: false, answer: "Those get a pulse, and a pulse dies away." },
          { text: "None", isRight: false, answer: "Look at the line that says `on`." },
        ],
      },
    },
    {
      id: "find-them",
      kind: "run",
      title: "Find the relays",
      text: ["Run it. Which fronts of the north side have a relay box? Point at one and read which line lights it."],
      starter: BY_BOX,
      checks: [
        {
          id: "ironmonger",
          kind: "lit",
          lights: { front: "ironmonger" },
          atBeat: 15,
          text: "The ironmonger is lit at beat 15.",
          hint: "Put the starter back and run it.",
        },
        {
          id: "bakery",
          kind: "dark",
          lights: { front: "bakery" },
          atBeat: 15,
          text: "The bakery is dark at beat 15.",
          hint: "Put the starter back and run it.",
        },
      ],
      solution: BY_BOX,
    },
    {
      id: "one-or-three",
      kind: "investigate",
      title: "One, or three?",
      text: [
        "This script will not run. The message is about line 2.",
        "You know what one `=` does. You met it in lesson 2.",
      ],
      starter:
        'for (let turn = 0; turn < 4; turn++) {\n  if (turn = 2) {\n    square.front("chapel").pulse(2);\n  }\n  wait(2);\n}\n',
      question: {
        ask: "What is wrong with `turn = 2`?",
        choices: [
          {
            text: "It puts 2 into the box. It does not ask.",
            isRight: true,
            answer: "Yes. To ask, you need three of them: `turn === 2`.",
          },
          { text: "`turn` can never be 2", isRight: false, answer: "It can: it counts 0, 1, 2, 3." },
          { text: "The 2 needs quotes", isRight: false, answer: "Numbers stand without quotes." },
        ],
      },
    },
    {
      id: "every-third-turn",
      kind: "change",
      title: "Every third turn",
      text: [
        "All pulses are gold. Make turns 0, 3, 6 and 9 tomato, and leave the others gold.",
        "`turn % 3` is 0 in just those turns.",
      ],
      starter: 'for (let turn = 0; turn < 12; turn++) {\n  square.front("bookshop").pulse(2, "gold");\n  wait(2);\n}\n',
      aim: EVERY_THIRD,
      checks: [
        {
          id: "turn-0",
          kind: "colour",
          lights: { front: "bookshop" },
          atBeat: 0.5,
          colour: "tomato",
          text: "Turn 0 is tomato.",
          hint: "Write `if (turn % 3 === 0) {` and the tomato pulse in it.",
        },
        {
          id: "turn-1",
          kind: "colour",
          lights: { front: "bookshop" },
          atBeat: 2.5,
          colour: "gold",
          text: "Turn 1 is gold.",
          hint: "Put the gold pulse after `else`.",
        },
        {
          id: "turn-9",
          kind: "colour",
          lights: { front: "bookshop" },
          atBeat: 18.5,
          colour: "tomato",
          text: "Turn 9 is tomato.",
          hint: "9 shared by 3 leaves 0.",
        },
        {
          id: "if",
          kind: "uses",
          what: "if",
          text: "The script has an `if`.",
          hint: "Start with `if (turn % 3 === 0) {`.",
        },
      ],
      solution: EVERY_THIRD,
    },
    {
      id: "kind-to-relays",
      kind: "change",
      title: "Be kind to the relays",
      text: [
        "A relay is a switch that moves. It clicks and it wears out, so it should stay on for a while.",
        "Give fronts with a relay box a pulse of 4 beats. All the others keep their pulse of 1 beat.",
      ],
      starter: 'for (const front of square.side("north")) {\n  front.pulse(1);\n  wait(1);\n}\n',
      aim: 'for (const front of square.side("north")) {\n  if (front.box === "relay") {\n    front.pulse(4);\n  } else {\n    front.pulse(1);\n  }\n  wait(1);\n}\n',
      checks: [
        {
          id: "relay-long",
          kind: "lit",
          lights: { front: "ironmonger" },
          atBeat: 5,
          text: "The ironmonger is still lit at beat 5.",
          hint: "It comes on at beat 2 and needs `pulse(4)`.",
        },
        {
          id: "others-short",
          kind: "dark",
          lights: { front: "library" },
          atBeat: 4.5,
          text: "The library is dark again at beat 4.5.",
          hint: "Fronts without a relay box keep `pulse(1)`.",
        },
        {
          id: "asks",
          kind: "quoted",
          quoted: "relay",
          atLeast: 1,
          text: "The script asks for the kind of box.",
          hint: 'Write `if (front.box === "relay") {`.',
        },
        {
          id: "like-the-aim",
          kind: "same-as-aim",
          text: "Your ribbon looks like the aim.",
          hint: "Keep `wait(1)` after the `if` and the `else`.",
        },
      ],
      solution:
        'for (const front of square.side("north")) {\n  if (front.box === "relay") {\n    front.pulse(4);\n  } else {\n    front.pulse(1);\n  }\n  wait(1);\n}\n',
    },
    {
      id: "two-questions",
      kind: "change",
      title: "Two questions at once",
      text: [
        "`now()` is the beat the clock is at. `&&` means: both must be true.",
        "Light only fronts with a colour box, and only before beat 20. The others stay dark.",
      ],
      starter:
        'for (const front of square.fronts) {\n  if (front.box === "colour") {\n    front.pulse(2, "skyblue");\n  }\n  wait(1);\n}\n',
      aim: 'for (const front of square.fronts) {\n  if (front.box === "colour" && now() < 20) {\n    front.pulse(2, "skyblue");\n  }\n  wait(1);\n}\n',
      checks: [
        {
          id: "early",
          kind: "lit",
          lights: { front: "hat shop" },
          atBeat: 17.5,
          text: "The hat shop, a colour front, is lit at beat 17.5.",
          hint: "Keep the question about the box.",
        },
        {
          id: "late",
          kind: "dark",
          lights: { front: "corner cafe" },
          atBeat: 25.5,
          text: "The corner cafe stays dark: it comes too late.",
          hint: "Add `&& now() < 20` inside the brackets.",
        },
        {
          id: "clock",
          kind: "word",
          word: "now",
          atLeast: 1,
          text: "The script asks the clock.",
          hint: "Write `now()` with its brackets.",
        },
      ],
      solution:
        'for (const front of square.fronts) {\n  if (front.box === "colour" && now() < 20) {\n    front.pulse(2, "skyblue");\n  }\n  wait(1);\n}\n',
    },
    {
      id: "your-luck",
      kind: "make",
      title: "A show with luck",
      text: [
        "`chance(30)` says yes in about 30 of 100 times. `roll(6)` is a number from 1 to 6.",
        "Make a show in which luck decides something. Use `chance`, and an `if` with an `else`.",
        "The luck of a show stays the same each time it plays. The town will see what you saw.",
      ],
      starter: "// My luck\nfor (const front of square.fronts) {\n}\n",
      checks: [
        {
          id: "chance",
          kind: "word",
          word: "chance",
          atLeast: 1,
          text: "The script uses `chance`.",
          hint: "Try `if (chance(50)) {`.",
        },
        {
          id: "if",
          kind: "uses",
          what: "if",
          text: "The script has an `if`.",
          hint: "Put `chance` between the brackets of the `if`.",
        },
        {
          id: "fronts",
          kind: "fronts-lit",
          atLeast: 10,
          text: "At least ten fronts light up.",
          hint: "Let the `else` light something as well.",
        },
        {
          id: "two-colours",
          kind: "colours-seen",
          atLeast: 2,
          text: "At least two colours can be seen.",
          hint: "Give the `if` one colour and the `else` another one.",
        },
        {
          id: "long-enough",
          kind: "lasts-until",
          beat: 30,
          text: "Something still changes at beat 30 or later.",
          hint: "41 fronts with `wait(1)` last for 41 beats.",
        },
      ],
      solution:
        '// My luck\nfor (const front of square.fronts) {\n  if (chance(40)) {\n    front.pulse(roll(3) + 1, "tomato");\n  } else {\n    front.pulse(2, "gold");\n  }\n  wait(1);\n}\n',
    },
  ],
  teacherNotes: [
    "Plan for 40 minutes: 5 to play a yes-or-no game; 7 for predict and run; 5 to investigate; 15 for the three changes; 6 for their own luck; 2 to compare.",
    "The game: everybody stands. Read out `if you wear a jumper, sit down, else put a hand up`. Every person does just one of the two. The same is true of every front.",
    "Watch for one `=` in a question. The message says so. One puts a value in, three ask.",
    "Watch for the belief that `if` waits until something becomes true. It asks once, at that moment of the script, and goes on.",
    "Relay boxes are slow and clicks wear them out. Short pulses on them bring a warning in the show check later. This is where the question about `front.box` comes from.",
    "The luck of a show is kept with it. That is why a show looks the same on the laptop and on the square.",
    "Good questions: What was the answer to the question this time? Which lines ran? Which fronts would change if you swapped the two halves?",
    "Done early: a question inside a question, or a variable that counts how often `chance` said yes, printed at the end.",
  ],
};
