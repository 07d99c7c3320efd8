import type { LessonInput } from "./schema.ts";

/** Lesson 1: turning fronts on and off, and letting beats pass. */
export const FIRST_LIGHT: LessonInput = {
  id: "first-light",
  version: 1,
  number: 1,
  title: "First light",
  summary: "Turn a shop on the town square on and off, and let the song play in between.",
  words: ["square", "front", "on", "off", "wait"],
  typescript: ["a call", "text in quotes", "a number"],
  minutes: 40,
  songId: "frost-fair",
  seed: 1,
  steps: [
    {
      id: "how-long",
      kind: "predict",
      title: "Read before you run",
      text: [
        "This script lights one shop on the square. Read it out loud, line by line. Do not run it yet.",
        "`wait` lets beats of the song go by. The lights stay as they are while it waits.",
      ],
      starter: 'square.front("bakery").on();\nwait(2);\nsquare.front("bakery").off();\n',
      question: {
        ask: "How long will the bakery be lit?",
        choices: [
          { text: "For 2 beats of the song", isRight: true, answer: "Yes. It comes on at beat 0. The clock waits 2 beats, and then it goes off." },
          { text: "For 2 seconds", isRight: false, answer: "Close. `wait` counts beats, not seconds. In a fast song 2 beats are short." },
          { text: "Until the song ends", isRight: false, answer: "Look at line 3. It turns the bakery off." },
          { text: "Not at all", isRight: false, answer: "Line 1 turns it on, and line 2 waits. There is time to see it." },
        ],
      },
    },
    {
      id: "see-it",
      kind: "run",
      title: "Now run it",
      text: [
        "Press Run, then press Play. Watch the bakery. It is the first shop on the north side.",
        "The line that lights the square glows while you watch.",
      ],
      starter: 'square.front("bakery").on();\nwait(2);\nsquare.front("bakery").off();\n',
      checks: [
        { id: "lit-first", kind: "lit", lights: { front: "bakery" }, atBeat: 1, text: "The bakery is lit at beat 1.", hint: "Line 1 should say `on()`." },
        { id: "dark-later", kind: "dark", lights: { front: "bakery" }, atBeat: 3, text: "The bakery is dark at beat 3.", hint: "Line 3 should say `off()`." },
      ],
      solution: 'square.front("bakery").on();\nwait(2);\nsquare.front("bakery").off();\n',
    },
    {
      id: "without-wait",
      kind: "investigate",
      title: "What does wait do?",
      text: [
        "Only `wait` moves the clock. All other lines take no time at all.",
        "Think about the script without line 2. You can take the line out and run it.",
      ],
      starter: 'square.front("bakery").on();\nsquare.front("bakery").off();\n',
      question: {
        ask: "There is no `wait` now. What will people on the square see?",
        choices: [
          { text: "The bakery stays dark", isRight: true, answer: "Yes. On and off come at the same time, so nobody can see the light." },
          { text: "A very short flash", isRight: false, answer: "Not even that. Both lines happen at beat 0. The last one wins." },
          { text: "The bakery stays on", isRight: false, answer: "The second line comes last, so off wins." },
        ],
      },
    },
    {
      id: "longer",
      kind: "change",
      title: "Make it last",
      text: ["Change the script so that the bakery stays lit for 8 beats.", "You need to change just one number."],
      starter: 'square.front("bakery").on();\nwait(2);\nsquare.front("bakery").off();\n',
      aim: 'square.front("bakery").on();\nwait(8);\nsquare.front("bakery").off();\n',
      checks: [
        { id: "still-lit", kind: "lit", lights: { front: "bakery" }, atBeat: 7.5, text: "The bakery is still lit just before beat 8.", hint: "Look at the number in `wait`." },
        { id: "then-dark", kind: "dark", lights: { front: "bakery" }, atBeat: 8.5, text: "The bakery is dark after beat 8.", hint: "`wait(8)` lets 8 beats go by." },
      ],
      solution: 'square.front("bakery").on();\nwait(8);\nsquare.front("bakery").off();\n',
    },
    {
      id: "two-shops",
      kind: "change",
      title: "First one, then the other",
      text: [
        "Here both shops come on at once. Make them take turns.",
        "First the bakery is lit for 4 beats. When it goes off, the library comes on for 4 beats.",
        "The ribbon under the square shows the aim.",
      ],
      starter: 'square.front("bakery").on();\nsquare.front("library").on();\nwait(4);\nsquare.front("bakery").off();\nsquare.front("library").off();\n',
      aim: 'square.front("bakery").on();\nwait(4);\nsquare.front("bakery").off();\nsquare.front("library").on();\nwait(4);\nsquare.front("library").off();\n',
      checks: [
        { id: "bakery-alone", kind: "dark", lights: { front: "library" }, atBeat: 2, text: "The library is dark at beat 2.", hint: "Move the line that lights the library below the first `wait`." },
        { id: "library-lit", kind: "lit", lights: { front: "library" }, atBeat: 6, text: "The library is lit at beat 6.", hint: "Add a second `wait(4);` after the library comes on." },
        { id: "two-waits", kind: "word", word: "wait", atLeast: 2, text: "The script waits two times.", hint: "Each shop needs a `wait` of its own." },
        { id: "like-the-aim", kind: "same-as-aim", text: "Your ribbon looks like the aim.", hint: "Compare both ribbons from the left. Find the first place where they differ." },
      ],
      solution: 'square.front("bakery").on();\nwait(4);\nsquare.front("bakery").off();\nsquare.front("library").on();\nwait(4);\nsquare.front("library").off();\n',
    },
    {
      id: "quotes",
      kind: "change",
      title: "Mend it",
      text: ["This script will not run. Press Run and read the message.", "Mend it so that the tea room lights up."],
      starter: "square.front(bakery).on();\nwait(4);\nsquare.front(bakery).off();\n",
      checks: [
        { id: "tea-room-lit", kind: "lit", lights: { front: "tea room" }, atBeat: 2, text: "The tea room is lit at beat 2.", hint: 'Names go in quotes: `square.front("tea room")`.' },
        { id: "tea-room-dark", kind: "dark", lights: { front: "tea room" }, atBeat: 5, text: "The tea room is dark at beat 5.", hint: "Turn the same front off that you turned on." },
        { id: "no-bakery", kind: "dark", lights: { front: "bakery" }, atBeat: 2, text: "The bakery stays dark.", hint: "Change the name on both lines." },
      ],
      solution: 'square.front("tea room").on();\nwait(4);\nsquare.front("tea room").off();\n',
    },
    {
      id: "your-street",
      kind: "make",
      title: "Light your own street",
      text: [
        "Choose at least three fronts. Light them one after the other, not all at once.",
        "Make your show last for 16 beats or more. Turn everything off at the end.",
        "Read the script to a neighbour. Can they guess what it will look like?",
      ],
      starter: '// My street\nsquare.front("bakery").on();\n',
      checks: [
        { id: "three-fronts", kind: "fronts-lit", atLeast: 3, text: "At least three fronts light up.", hint: "Add a line for each front. The Names list shows all of them." },
        { id: "waits", kind: "word", word: "wait", atLeast: 3, text: "The script waits at least three times.", hint: "Put a `wait` between two fronts." },
        { id: "long-enough", kind: "lasts-until", beat: 16, text: "The show lasts for 16 beats or more.", hint: "Add up the numbers in your `wait` lines." },
        { id: "dark-end", kind: "dark-at-the-end", text: "All is dark at the end.", hint: "Every front that you turn on needs an `off()`." },
      ],
      solution:
        '// My street\nsquare.front("bakery").on();\nwait(4);\nsquare.front("cinema").on();\nwait(4);\nsquare.front("museum").on();\nwait(8);\nsquare.front("bakery").off();\nsquare.front("cinema").off();\nsquare.front("museum").off();\n',
    },
  ],
  teacherNotes: [
    "Plan for 40 minutes: 5 to show the square and the song; 8 for predict and run, with hands up before anybody presses Run; 5 to investigate in pairs; 12 for the three changes; 8 for their own street; 2 to look at three ribbons together.",
    "You need no programming. A script is read from top to bottom. Only `wait` takes time. If you can read it aloud, you can help with it.",
    "Watch for the belief that a light needs a moment to be seen by itself. On and off with no `wait` between them come at the same time, and nothing is seen. Let them find it in the investigate step.",
    "Watch for names without quotes, and for capital letters: `Wait` is not `wait`. The message names the line. Ask the learner to read it to you before you look.",
    "Good questions: Which line is glowing now? At which beat does this line happen? What would change if these two lines swapped places?",
    "Done early: let two shops be lit together for some of the time, or make the waits follow the first tune.",
    "If someone dislikes bright changes, the gentle preview limits them. No lesson asks for fast flashing.",
  ],
};
