import type { LessonInput } from "./schema.ts";

const ROUND = 'for (const front of square.fronts) {\n  front.pulse(1, "gold");\n  wait(0.5);\n}\n';

/** Lesson 3: doing the same with every front of the square. */
export const FOR_EACH_FRONT: LessonInput = {
  id: "for-each-front",
  version: 1,
  number: 3,
  title: "Once round the square",
  summary: "Say it once and let it happen for each front, all the way round the square.",
  words: ["fronts"],
  typescript: ["for..of", "braces"],
  minutes: 40,
  songId: "quillhaven-bells",
  seed: 3,
  steps: [
    {
      id: "four-lines",
      kind: "predict",
      title: "Four lines, 41 fronts",
      text: [
        "`square.fronts` is the list of all fronts in walking order: round the square, and the tree at the end. There are 41 of them.",
        "The lines between `{` and `}` happen once for each front.",
      ],
      starter: ROUND,
      question: {
        ask: "How many pulses does this script write?",
        choices: [
          { text: "1", isRight: false, answer: "There is one `pulse` line, but it happens once for each front." },
          { text: "4", isRight: false, answer: "Four lines of text, yes. The line with `pulse` runs many times." },
          { text: "41", isRight: true, answer: "Yes. One for each front, and the tree is the last." },
          { text: "It never ends", isRight: false, answer: "It ends when the list has no more fronts." },
        ],
      },
    },
    {
      id: "walk-round",
      kind: "run",
      title: "Walk round the square",
      text: ["Press Run, then Play. Turn the view to follow the light from side to side.", "Which front is the last one?"],
      starter: ROUND,
      checks: [
        { id: "all-41", kind: "fronts-lit", atLeast: 41, text: "All 41 fronts light up.", hint: "Put the starter back and run it." },
        { id: "in-order", kind: "in-walking-order", atLeast: 41, text: "They come on in walking order.", hint: "Keep the `wait` between the braces." },
      ],
      solution: ROUND,
    },
    {
      id: "where-is-the-wait",
      kind: "investigate",
      title: "In or out?",
      text: ["Now the `wait` has moved. It stands after the `}`.", "Think first. Then run it and see."],
      starter: 'for (const front of square.fronts) {\n  front.pulse(1, "gold");\n}\nwait(0.5);\n',
      question: {
        ask: "What do people see now?",
        choices: [
          { text: "All fronts pulse at the same time", isRight: true, answer: "Yes. Nothing waits inside the loop, so every pulse comes at beat 0." },
          { text: "The same walk as before", isRight: false, answer: "The `wait` comes only once, after all fronts are done." },
          { text: "Only the last front lights up", isRight: false, answer: "All of them do. They are just not one after the other." },
        ],
      },
    },
    {
      id: "mend-the-loop",
      kind: "change",
      title: "One by one",
      text: ["All fronts come on at once here. Make them come on one by one, 1 beat apart.", "They should stay lit."],
      starter: "for (const front of square.fronts) {\n  front.on();\n}\nwait(1);\n",
      aim: "for (const front of square.fronts) {\n  front.on();\n  wait(1);\n}\n",
      checks: [
        { id: "in-order", kind: "in-walking-order", atLeast: 41, text: "The fronts come on one after the other.", hint: "Move the `wait` above the `}`." },
        { id: "bakery-stays", kind: "lit", lights: { front: "bakery" }, atBeat: 30, text: "The bakery is still lit at beat 30.", hint: "Use `on`, and do not turn anything off." },
        { id: "like-the-aim", kind: "same-as-aim", text: "Your ribbon looks like the aim.", hint: "Each front comes 1 beat after the one before." },
      ],
      solution: "for (const front of square.fronts) {\n  front.on();\n  wait(1);\n}\n",
    },
    {
      id: "missing-brace",
      kind: "change",
      title: "Something is missing",
      text: ["This script will not run. Read the message. Which line does it name?", "Mend it, so that each front pulses in plum and the next one comes 1 beat later."],
      starter: 'for (const front of square.fronts) {\n  front.pulse(2, "plum");\n  wait(1);\n',
      checks: [
        { id: "all-41", kind: "fronts-lit", atLeast: 41, text: "All 41 fronts light up.", hint: "The loop needs a `}` at its end." },
        { id: "plum", kind: "colour", lights: { front: "bookshop" }, atBeat: 1.25, colour: "plum", text: "The bookshop pulses in plum after beat 1.", hint: 'Keep `pulse(2, "plum")`.' },
        { id: "in-order", kind: "in-walking-order", atLeast: 41, text: "They come on one after the other.", hint: "The `wait` belongs inside the braces." },
      ],
      solution: 'for (const front of square.fronts) {\n  front.pulse(2, "plum");\n  wait(1);\n}\n',
    },
    {
      id: "on-and-off",
      kind: "change",
      title: "There and gone",
      text: [
        "First all fronts come on one by one, 1 beat apart. Then they should go off one by one, 1 beat apart.",
        "You need a second loop after the first one.",
      ],
      starter: "for (const front of square.fronts) {\n  front.on();\n  wait(1);\n}\n",
      aim: "for (const front of square.fronts) {\n  front.on();\n  wait(1);\n}\nfor (const front of square.fronts) {\n  front.off();\n  wait(1);\n}\n",
      checks: [
        { id: "two-loops", kind: "uses", what: "for-of", atLeast: 2, text: "The script has two `for..of` loops.", hint: "Copy the loop, and change `on` to `off` in the copy." },
        { id: "bakery-off", kind: "dark", lights: { front: "bakery" }, atBeat: 42, text: "The bakery is dark at beat 42.", hint: "The second loop starts with the bakery again." },
        { id: "tree-on", kind: "lit", lights: { front: "tree" }, atBeat: 60, text: "The tree is still lit at beat 60.", hint: "Keep a `wait(1)` in the second loop too." },
        { id: "dark-end", kind: "dark-at-the-end", text: "All is dark at the end.", hint: "Each front needs an `off()`." },
      ],
      solution: "for (const front of square.fronts) {\n  front.on();\n  wait(1);\n}\nfor (const front of square.fronts) {\n  front.off();\n  wait(1);\n}\n",
    },
    {
      id: "your-round",
      kind: "make",
      title: "Your own round",
      text: [
        "Make a show that goes round the square at least two times. Each round should look different.",
        "You may use `on`, `off`, `pulse` and `colour`. Keep a colour or a wait in a variable.",
        "Make it last for 40 beats or more.",
      ],
      starter: "// My round\nfor (const front of square.fronts) {\n}\n",
      checks: [
        { id: "two-loops", kind: "uses", what: "for-of", atLeast: 2, text: "The script has at least two `for..of` loops.", hint: "One loop is one round. Write a second one below it." },
        { id: "all-fronts", kind: "fronts-lit", atLeast: 41, text: "Every front lights up at some time.", hint: "Use `front` inside the braces, not just one name." },
        { id: "two-colours", kind: "colours-seen", atLeast: 2, text: "At least two colours can be seen.", hint: "Give the second round another colour." },
        { id: "variable", kind: "uses", what: "variable", text: "The script has a variable.", hint: 'Try `const mood = "gold";` at the top.' },
        { id: "long-enough", kind: "lasts-until", beat: 40, text: "The show lasts for 40 beats or more.", hint: "41 fronts with `wait(1)` last 41 beats." },
      ],
      solution:
        '// My round\nconst first = "gold";\nconst second = "skyblue";\nfor (const front of square.fronts) {\n  front.pulse(2, first);\n  wait(0.5);\n}\nfor (const front of square.fronts) {\n  front.pulse(4, second);\n  wait(1);\n}\n',
    },
  ],
  teacherNotes: [
    "Plan for 40 minutes: 5 to act the loop out; 8 for predict and run; 5 to investigate; 14 for the three changes; 6 for their own round; 2 to look at ribbons.",
    "Act it out: ten learners stand in a row as fronts. One reads the lines between the braces to each of them in turn: clap, wait one beat. Then read them with the wait outside: all clap at once.",
    "Watch for a `wait` after the closing brace. It is the slip of this lesson. In the ribbon, a wait inside gives a slope and a wait outside gives a wall.",
    "Watch for a missing brace. The message names the line whose brace is open. Lines between braces are moved in by two blanks, and that shows where one is missing.",
    "Watch for the name `front`. It is a name the learner makes, and it stands for another front each time round. `house` would do as well. `square.front(\"bakery\")` with brackets is always the same one.",
    "Some fronts have boxes that are only on or off, and some have no colour lights. Colours are seen on the others. That is a good moment to ask how the real square is wired.",
    "Good questions: How often does this line run? Which front is it the third time? What comes after the last one?",
    "Done early: put two waits of different length in one loop, or one loop that pulses and one that sets the colour.",
  ],
};
