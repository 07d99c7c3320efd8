import type { LessonInput } from "./schema.ts";

const FOUR =
  'const north = square.side("north");\nfor (let n = 1; n < 5; n++) {\n  north.first(n).on();\n  wait(2);\n}\n';

/** Lesson 4: loops that count, and fades. */
export const COUNTING: LessonInput = {
  id: "counting",
  version: 1,
  number: 4,
  title: "Count the lights in",
  summary: "Use a loop that counts, and let its number decide how many and how bright.",
  words: ["all", "side", "first", "fadeTo"],
  typescript: ["for (let i ...)", "<"],
  minutes: 40,
  songId: "good-king-wenceslas",
  seed: 4,
  steps: [
    {
      id: "one-to-four",
      kind: "predict",
      title: "From 1, while it is less than 5",
      text: [
        "`for (let n = 1; n < 5; n++)` counts. `n` starts at 1. The lines in braces run while `n` is less than 5. After each turn `n` goes up by 1.",
        "`north.first(n)` is the first `n` fronts of the north side.",
      ],
      starter: FOUR,
      question: {
        ask: "How many fronts are lit in the end?",
        choices: [
          { text: "1", isRight: false, answer: "In the first turn, yes. Then the count goes on." },
          {
            text: "4",
            isRight: true,
            answer: "Yes. The last turn is the one with 4. Then `n` is 5, and 5 is not less than 5.",
          },
          { text: "5", isRight: false, answer: "When `n` is 5, the loop is over. Its lines do not run for 5." },
          {
            text: "10",
            isRight: false,
            answer: "1 + 2 + 3 + 4 is 10 steps, but the first front is on already. Nothing new happens to it.",
          },
        ],
      },
    },
    {
      id: "watch-them",
      kind: "run",
      title: "Run it and count along",
      text: [
        "Press Run and Play. Say the value of `n` out loud with each change.",
        "Look at the ribbon. What does it look like?",
      ],
      starter: FOUR,
      checks: [
        {
          id: "library",
          kind: "lit",
          lights: { front: "library" },
          atBeat: 7,
          text: "The library is lit at beat 7.",
          hint: "Put the starter back and run it.",
        },
        {
          id: "town-hall",
          kind: "dark",
          lights: { front: "town hall" },
          atBeat: 9,
          text: "The town hall stays dark.",
          hint: "Put the starter back and run it.",
        },
      ],
      solution: FOUR,
    },
    {
      id: "cut-short",
      kind: "investigate",
      title: "A fade needs its time",
      text: [
        "`fadeTo(100, 8)` goes up to 100 in 8 beats, bit by bit. It does not wait. The next line comes at once.",
        "Here the script waits only 2 beats. Then it starts a new fade.",
      ],
      starter: "square.all.fadeTo(100, 8);\nwait(2);\nsquare.all.fadeTo(0, 8);\n",
      question: {
        ask: "How bright does the tree get?",
        choices: [
          { text: "100", isRight: false, answer: "It would need 8 beats for that. The second fade cuts in after 2." },
          { text: "25", isRight: true, answer: "Yes. 2 of 8 beats is a quarter of the way. Then it turns round." },
          { text: "0", isRight: false, answer: "It starts to glow at once. It is on its way up for 2 beats." },
        ],
      },
    },
    {
      id: "all-ten",
      kind: "change",
      title: "All ten",
      text: ["The side has ten fronts. Change the loop so that all ten come on, one more every 2 beats."],
      starter: FOUR,
      aim: 'const north = square.side("north");\nfor (let n = 1; n < 11; n++) {\n  north.first(n).on();\n  wait(2);\n}\n',
      checks: [
        {
          id: "all-lit",
          kind: "lit",
          lights: { side: "north" },
          atBeat: 19,
          text: "The whole north side is lit at beat 19.",
          hint: "The last turn should be the one with 10.",
        },
        {
          id: "not-sooner",
          kind: "dark",
          lights: { front: "florist" },
          atBeat: 17,
          text: "The florist is still dark at beat 17.",
          hint: "Keep `first(n)` and the `wait(2)`.",
        },
        {
          id: "counts",
          kind: "uses",
          what: "for",
          text: "The script has a loop that counts.",
          hint: "Keep the `for` line and change one number in it.",
        },
      ],
      solution:
        'const north = square.side("north");\nfor (let n = 1; n < 11; n++) {\n  north.first(n).on();\n  wait(2);\n}\n',
    },
    {
      id: "let-it-finish",
      kind: "change",
      title: "Let it finish",
      text: [
        "The square should go up to 100 in 8 beats, and then down to 0 in 8 beats.",
        "Both fades should run to their end. You need to change just one number.",
      ],
      starter: "square.all.fadeTo(100, 8);\nwait(2);\nsquare.all.fadeTo(0, 8);\n",
      aim: "square.all.fadeTo(100, 8);\nwait(8);\nsquare.all.fadeTo(0, 8);\n",
      checks: [
        {
          id: "full",
          kind: "lit",
          lights: { front: "tree" },
          atBeat: 7.75,
          atLeast: 90,
          text: "The tree is nearly full at the end of beat 7.",
          hint: "Wait as long as the fade takes.",
        },
        {
          id: "dark",
          kind: "dark",
          lights: {},
          atBeat: 17,
          text: "All is dark at beat 17.",
          hint: "Keep the second fade.",
        },
        {
          id: "like-the-aim",
          kind: "same-as-aim",
          text: "Your ribbon looks like the aim.",
          hint: "The first fade takes 8 beats.",
        },
      ],
      solution: "square.all.fadeTo(100, 8);\nwait(8);\nsquare.all.fadeTo(0, 8);\n",
    },
    {
      id: "steps-of-light",
      kind: "change",
      title: "Steps of light",
      text: [
        "All ten turns fade to 50 here, so only the first one can be seen.",
        "Use the count: the first turn fades to 10, the next one to 20, and so on up to 100.",
      ],
      starter: 'for (let n = 1; n < 11; n++) {\n  square.side("south").fadeTo(50, 2);\n  wait(2);\n}\n',
      aim: 'for (let n = 1; n < 11; n++) {\n  square.side("south").fadeTo(n * 10, 2);\n  wait(2);\n}\n',
      checks: [
        {
          id: "ten-fades",
          kind: "cue-count",
          action: "fadeTo",
          atLeast: 10,
          atMost: 10,
          text: "There are ten fades.",
          hint: "Keep the loop as it is.",
        },
        {
          id: "short",
          kind: "word",
          word: "fadeTo",
          atLeast: 1,
          atMost: 1,
          text: "`fadeTo` is written only once.",
          hint: "Let the loop do the work: use `n` in the line.",
        },
        {
          id: "like-the-aim",
          kind: "same-as-aim",
          text: "Your ribbon looks like the aim.",
          hint: "10 is 1 times 10, and 20 is 2 times 10.",
        },
      ],
      solution: 'for (let n = 1; n < 11; n++) {\n  square.side("south").fadeTo(n * 10, 2);\n  wait(2);\n}\n',
    },
    {
      id: "your-count",
      kind: "make",
      title: "A show that counts",
      text: [
        "Make a show with at least two loops that count. Use the number of the loop in at least one of them.",
        "Use two sides of the square or more, and at least six fades. End in the dark, at beat 32 or later.",
      ],
      starter: "// My count\nfor (let n = 1; n < 5; n++) {\n}\n",
      checks: [
        {
          id: "two-loops",
          kind: "uses",
          what: "for",
          atLeast: 2,
          text: "The script has two loops that count.",
          hint: "Write a second `for` loop below the first.",
        },
        {
          id: "fades",
          kind: "cue-count",
          action: "fadeTo",
          atLeast: 6,
          text: "There are at least six fades.",
          hint: "A `fadeTo` inside a loop counts once for each turn.",
        },
        {
          id: "fronts",
          kind: "fronts-lit",
          atLeast: 11,
          text: "More than ten fronts light up.",
          hint: 'Use a second side: `square.side("south")`.',
        },
        {
          id: "long-enough",
          kind: "lasts-until",
          beat: 32,
          text: "Something still changes at beat 32 or later.",
          hint: "Add up your waits. More turns make it longer.",
        },
        {
          id: "dark-end",
          kind: "dark-at-the-end",
          text: "All is dark at the end.",
          hint: "End with `square.all.fadeTo(0, 4);`.",
        },
      ],
      solution:
        '// My count\nfor (let n = 1; n < 11; n++) {\n  square.side("north").first(n).fadeTo(80, 2);\n  wait(2);\n}\nfor (let n = 1; n < 6; n++) {\n  square.side("south").fadeTo(n * 20, 2);\n  wait(2);\n}\nwait(4);\nsquare.all.fadeTo(0, 4);\n',
    },
  ],
  teacherNotes: [
    "Plan for 40 minutes: 5 to count aloud with a row of learners; 8 for predict and run; 5 to investigate; 14 for the three changes; 6 for their own count; 2 to look at ribbons.",
    "Read the loop line in three parts: start at 1, go on while less than 5, add 1 after each turn. Write n = 1, 2, 3, 4 on the board and cross 5 out: this is the number at which it stops.",
    "Watch for one too many or one too few. It is the most common slip of all. Ask: which number does the last turn have?",
    "Watch for a wait that is shorter than the fade before it. The check names the line that cuts it off. In the ribbon such a fade never gets bright.",
    "Some boxes on the square can not fade: they are on or off, and come on when the level passes 50. This is how the real boxes work.",
    "Good questions: What is n now? How often has this line run? How many beats has the loop taken by then?",
    "Done early: count down with `n--`, or count in steps of 2 with `n = n + 2`.",
  ],
};
