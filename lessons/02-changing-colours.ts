import type { LessonInput } from "./schema.ts";

const THREE_STEPS =
  'let beats = 1;\nsquare.front("bookshop").on();\nwait(beats);\nbeats = beats + 1;\nsquare.front("tea room").on();\nwait(beats);\nsquare.front("florist").on();\nconsole.log("The last wait was", beats);\n';

/** Lesson 2: variables that hold numbers and colours, pulses and notes to oneself. */
export const CHANGING_COLOURS: LessonInput = {
  id: "changing-colours",
  version: 1,
  number: 2,
  title: "Colours in boxes",
  summary: "Keep a number or a colour in a variable, and let lights flash and die away.",
  words: ["colour", "pulse", "console.log"],
  typescript: ["let", "const", "+"],
  minutes: 40,
  songId: "frost-fair",
  seed: 2,
  steps: [
    {
      id: "which-beat",
      kind: "predict",
      title: "A number that changes",
      text: [
        "A variable is a box with a name. `let beats = 1;` puts the number 1 in a box named `beats`.",
        "`beats = beats + 1;` takes what is in the box, adds 1, and puts the answer back.",
      ],
      starter: THREE_STEPS,
      question: {
        ask: "At which beat does the florist come on?",
        choices: [
          { text: "At beat 1", isRight: false, answer: "That is when the tea room comes on." },
          {
            text: "At beat 2",
            isRight: false,
            answer: "The second wait is 2 beats long, but 1 beat had gone by before it.",
          },
          { text: "At beat 3", isRight: true, answer: "Yes. First it waits 1 beat, then 2 more." },
          {
            text: "All come on at beat 0",
            isRight: false,
            answer: "Only `wait` moves the clock, and here it does so two times.",
          },
        ],
      },
    },
    {
      id: "see-the-note",
      kind: "run",
      title: "Run it and read the note",
      text: [
        "Press Run. Look at the ribbon, then open the Notes.",
        "`console.log` writes a note to you. The town never sees it.",
      ],
      starter: THREE_STEPS,
      checks: [
        {
          id: "note",
          kind: "note",
          atLeast: 1,
          says: "The last wait was 2",
          text: "The note says what is in the box at the end.",
          hint: "Leave the last line as it is and run again.",
        },
        {
          id: "order",
          kind: "order",
          fronts: ["bookshop", "tea room", "florist"],
          text: "The three fronts come on in turn.",
          hint: "Put the starter back and run it.",
        },
      ],
      solution: THREE_STEPS,
    },
    {
      id: "kept-answer",
      kind: "investigate",
      title: "What stays in the box?",
      text: [
        "One `=` means: work out the right side, and put the answer into the box on the left.",
        "Go through these four lines with a pencil. Write down what is in each box after every line.",
      ],
      starter: "let first = 1;\nlet second = first + 1;\nfirst = 5;\nconsole.log(second);\n",
      question: {
        ask: "What does the note say?",
        choices: [
          {
            text: "2",
            isRight: true,
            answer: "Yes. The sum was worked out in line 2, when `first` was 1. Later changes do not matter.",
          },
          {
            text: "6",
            isRight: false,
            answer: "A box keeps a number, not a sum. Line 2 put in 2, and nothing has changed it since.",
          },
          { text: "5", isRight: false, answer: "5 is in the other box. The note prints `second`." },
        ],
      },
    },
    {
      id: "one-word",
      kind: "change",
      title: "One word for all",
      text: [
        "`colour` sets the colour of the lights. Some fronts have plain lamps and stay warm white.",
        'The colour stands in three places here. Put it in one: make a `const` named `mood` at the top, and use it three times. Then make it `"tomato"`.',
        "A `const` is a box that keeps what you put in first.",
      ],
      starter:
        'square.front("bookshop").on();\nsquare.front("bookshop").colour("gold");\nsquare.front("tea room").on();\nsquare.front("tea room").colour("gold");\nsquare.front("florist").on();\nsquare.front("florist").colour("gold");\n',
      aim: 'const mood = "tomato";\nsquare.front("bookshop").on();\nsquare.front("bookshop").colour(mood);\nsquare.front("tea room").on();\nsquare.front("tea room").colour(mood);\nsquare.front("florist").on();\nsquare.front("florist").colour(mood);\n',
      checks: [
        {
          id: "tomato",
          kind: "colour",
          lights: { side: "north" },
          atBeat: 1,
          colour: "tomato",
          text: "All three fronts shine in tomato.",
          hint: "Each of the three should say `colour(mood)`.",
        },
        {
          id: "once",
          kind: "quoted",
          quoted: "tomato",
          atLeast: 1,
          atMost: 1,
          text: 'The text "tomato" stands there only once.',
          hint: 'Write `const mood = "tomato";` on line 1.',
        },
        {
          id: "const",
          kind: "uses",
          what: "constant",
          text: "The script has a `const`.",
          hint: 'Begin with `const mood = "tomato";`.',
        },
      ],
      solution:
        'const mood = "tomato";\nsquare.front("bookshop").on();\nsquare.front("bookshop").colour(mood);\nsquare.front("tea room").on();\nsquare.front("tea room").colour(mood);\nsquare.front("florist").on();\nsquare.front("florist").colour(mood);\n',
    },
    {
      id: "slower",
      kind: "change",
      title: "Slower and slower",
      text: [
        "`pulse(2)` is a flash that dies away over 2 beats. It goes dark all by itself.",
        "Here every wait is 1 beat. Make each wait 1 beat longer than the one before: 1, 2, 3. Use the variable, and do not write 2 or 3 in a `wait`.",
      ],
      starter:
        'let gap = 1;\nsquare.front("cinema").pulse(2, "gold");\nwait(gap);\nsquare.front("cinema").pulse(2, "gold");\nwait(gap);\nsquare.front("cinema").pulse(2, "gold");\nwait(gap);\nsquare.front("cinema").pulse(2, "gold");\n',
      aim: 'let gap = 1;\nsquare.front("cinema").pulse(2, "gold");\nwait(gap);\ngap = gap + 1;\nsquare.front("cinema").pulse(2, "gold");\nwait(gap);\ngap = gap + 1;\nsquare.front("cinema").pulse(2, "gold");\nwait(gap);\nsquare.front("cinema").pulse(2, "gold");\n',
      checks: [
        {
          id: "four-pulses",
          kind: "cue-count",
          action: "pulse",
          atLeast: 4,
          atMost: 4,
          text: "There are four pulses.",
          hint: "Keep the four `pulse` lines.",
        },
        {
          id: "grows",
          kind: "uses",
          what: "changing-variable",
          atLeast: 2,
          text: "The variable gets a new value two times.",
          hint: "Write `gap = gap + 1;` after a `wait`.",
        },
        {
          id: "last-pulse",
          kind: "lit",
          lights: { front: "cinema" },
          atBeat: 6.25,
          text: "The last pulse comes at beat 6.",
          hint: "1 + 2 + 3 is 6. Check each wait.",
        },
        {
          id: "like-the-aim",
          kind: "same-as-aim",
          text: "Your ribbon looks like the aim.",
          hint: "Put the new line after each of the first two waits.",
        },
      ],
      solution:
        'let gap = 1;\nsquare.front("cinema").pulse(2, "gold");\nwait(gap);\ngap = gap + 1;\nsquare.front("cinema").pulse(2, "gold");\nwait(gap);\ngap = gap + 1;\nsquare.front("cinema").pulse(2, "gold");\nwait(gap);\nsquare.front("cinema").pulse(2, "gold");\n',
    },
    {
      id: "colour-but-dark",
      kind: "change",
      title: "Why is it dark?",
      text: [
        "The script sets a colour, but the hat shop stays dark. A colour alone is not light.",
        "Mend it: the hat shop should shine in skyblue for 4 beats.",
      ],
      starter: 'square.front("hat shop").colour("skyblue");\nwait(4);\nsquare.front("hat shop").off();\n',
      checks: [
        {
          id: "blue",
          kind: "colour",
          lights: { front: "hat shop" },
          atBeat: 2,
          colour: "skyblue",
          text: "The hat shop shines in skyblue at beat 2.",
          hint: "Turn it on as well as giving it a colour.",
        },
        {
          id: "off-again",
          kind: "dark",
          lights: { front: "hat shop" },
          atBeat: 5,
          text: "The hat shop is dark at beat 5.",
          hint: "Keep the last line.",
        },
      ],
      solution:
        'square.front("hat shop").on();\nsquare.front("hat shop").colour("skyblue");\nwait(4);\nsquare.front("hat shop").off();\n',
    },
    {
      id: "your-colours",
      kind: "make",
      title: "Two colours of your own",
      text: [
        "Make a short show with two colours. Keep each colour in a `const`.",
        "Use a `let` variable for your waits, and let it change at least once. Use at least four pulses.",
        "Print one note that tells you something about your show.",
      ],
      starter: '// My two colours\nconst warm = "gold";\n',
      checks: [
        {
          id: "two-colours",
          kind: "colours-seen",
          atLeast: 2,
          text: "At least two colours can be seen.",
          hint: 'Give a pulse a colour: `pulse(2, warm)`. Use a front with colour lights, like the "bookshop".',
        },
        {
          id: "consts",
          kind: "uses",
          what: "constant",
          atLeast: 2,
          text: "Two colours are kept in a `const`.",
          hint: "Add a second `const` below the first one.",
        },
        {
          id: "changes",
          kind: "uses",
          what: "changing-variable",
          text: "A variable changes.",
          hint: "Try `let gap = 1;` and later `gap = gap + 1;`.",
        },
        {
          id: "pulses",
          kind: "cue-count",
          action: "pulse",
          atLeast: 4,
          text: "There are at least four pulses.",
          hint: "Write more `pulse` lines, each with a `wait` after it.",
        },
        {
          id: "a-note",
          kind: "note",
          atLeast: 1,
          text: "The script prints a note.",
          hint: 'Write `console.log("gap is", gap);`.',
        },
      ],
      solution:
        '// My two colours\nconst warm = "gold";\nconst cold = "skyblue";\nlet gap = 1;\nsquare.front("bookshop").pulse(2, warm);\nwait(gap);\nsquare.front("florist").pulse(2, cold);\nwait(gap);\ngap = gap + 1;\nsquare.front("tea room").pulse(2, warm);\nwait(gap);\nsquare.front("cinema").pulse(2, cold);\nconsole.log("gap is", gap);\n',
    },
  ],
  teacherNotes: [
    "Plan for 40 minutes: 5 to act out a variable with a real box and paper slips; 8 for predict and run; 5 to investigate; 12 for the three changes; 8 for their own colours; 2 to compare ribbons.",
    "A real box helps. Write 1 on a slip and put it in. For `beats = beats + 1` take the slip out, work out the sum, and put a new slip in. A sum that nobody keeps, like `beats + 1;` alone, is thrown away. The message for it says so.",
    "Watch for `=` read as a fact of mathematics: beats can not equal beats plus 1. Say it as: beats becomes beats plus 1.",
    "Watch for colour without light. Colour and level are two things. The hat shop step is there for this.",
    "Fronts with plain lamps ignore colours. That is true of the real square. The Names list shows which fronts have colour lights.",
    "A `const` can not get a new value. If somebody tries it, let them read the message and decide: is this a box that changes, or not?",
    "Good questions: What is in the box now? Where did it change? How many places must you edit to get another colour?",
    "Done early: let the waits shrink again, or keep the length of the pulse in a variable too. Waits below half a beat are a matter for later, since some boxes on the square can not switch that fast.",
  ],
};
