import type { LessonInput } from "./schema.ts";

const CHORUS_BARS =
  'const chorus = song.section("chorus");\nat(chorus.bars, () => {\n  square.side("north").pulse(3, "gold");\n});\n';
const TWO_MOODS =
  'const verse = song.section("verse");\nconst chorus = song.section("chorus");\nat(verse.start, () => square.all.fadeTo(20, 4));\nat(chorus.start, () => square.all.fadeTo(90, 4));\nat(chorus.end, () => square.all.fadeTo(0, 4));\n';

/** Lesson 8: the song's sections, bars and beats, and things that happen at a place in the song. */
export const SONG_DATA: LessonInput = {
  id: "song-data",
  version: 1,
  number: 8,
  title: "Ask the song",
  summary: "Let the lights follow the song: its verse and chorus, its bars and its beats.",
  words: ["song", "section", "bars", "beats", "at", "start", "end"],
  typescript: ["a list", "a function that is handed over"],
  minutes: 40,
  songId: "frost-fair",
  seed: 8,
  steps: [
    {
      id: "how-often",
      kind: "predict",
      title: "Every bar of the chorus",
      text: [
        'The song knows its own parts. `song.section("chorus")` is the first chorus. Its `bars` are a list of places: where each bar begins.',
        "`at(places, action)` runs the action at every one of them. The clock is set there, and afterwards it is set back.",
      ],
      starter: CHORUS_BARS,
      question: {
        ask: "The first chorus goes from beat 48 to beat 80, with 4 beats a bar. How many pulses are there?",
        choices: [
          { text: "1", isRight: false, answer: "The action runs at every place of the list, not just at the first." },
          { text: "8", isRight: true, answer: "Yes. 32 beats are 8 bars of 4, and each bar has one pulse." },
          { text: "32", isRight: false, answer: "That would be the list of beats. Here it is the list of bars." },
          { text: "16", isRight: false, answer: "There are two choruses in the song, but this is only the first one." },
        ],
      },
    },
    {
      id: "hear-the-chorus",
      kind: "run",
      title: "Hear the chorus come",
      text: [
        "Run it. Jump to the chorus in the ribbon and listen. Do the lights come with the first beat of each bar?",
      ],
      starter: CHORUS_BARS,
      checks: [
        {
          id: "eight",
          kind: "cue-count",
          action: "pulse",
          atLeast: 8,
          atMost: 8,
          text: "There are eight pulses.",
          hint: "Put the starter back and run it.",
        },
        {
          id: "dark-before",
          kind: "dark",
          lights: {},
          atBeat: 40,
          text: "All is dark before the chorus.",
          hint: "Put the starter back and run it.",
        },
      ],
      solution: CHORUS_BARS,
    },
    {
      id: "too-early",
      kind: "investigate",
      title: "Now, or then?",
      text: [
        "This script will not run. The message is about line 2.",
        "`() =>` turns a line into something that can be kept for later.",
      ],
      starter: "square.all.on();\nat(16, square.all.off());\n",
      question: {
        ask: "When would `square.all.off()` run in line 2, without `() =>`?",
        choices: [
          {
            text: "At beat 16",
            isRight: false,
            answer: "That was the plan. But the brackets of `off()` mean: run it now.",
          },
          {
            text: "At once, at beat 0",
            isRight: true,
            answer: "Yes. It would run before `at` even starts. `() => square.all.off()` keeps it for beat 16.",
          },
          { text: "Never", isRight: false, answer: "It would run, but too early." },
        ],
      },
    },
    {
      id: "every-beat",
      kind: "change",
      title: "From bars to beats",
      text: [
        "The tree pulses in every bar of the verse. Let it pulse on every beat of the verse.",
        "You need to change one word. Make the pulse 1 beat long, too.",
      ],
      starter:
        'const verse = song.section("verse");\nat(verse.bars, () => {\n  square.front("tree").pulse(2, "gold");\n});\n',
      aim: 'const verse = song.section("verse");\nat(verse.beats, () => {\n  square.front("tree").pulse(1, "gold");\n});\n',
      checks: [
        {
          id: "thirty-two",
          kind: "cue-count",
          action: "pulse",
          atLeast: 32,
          atMost: 32,
          text: "There are 32 pulses.",
          hint: "A section has `bars` and it has `beats`.",
        },
        {
          id: "second-beat",
          kind: "lit",
          lights: { front: "tree" },
          atBeat: 17.25,
          text: "The tree pulses on the second beat of the verse.",
          hint: "Write `verse.beats` in place of `verse.bars`.",
        },
        {
          id: "like-the-aim",
          kind: "same-as-aim",
          text: "Your ribbon looks like the aim.",
          hint: "The pulse is 1 beat long.",
        },
      ],
      solution:
        'const verse = song.section("verse");\nat(verse.beats, () => {\n  square.front("tree").pulse(1, "gold");\n});\n',
    },
    {
      id: "go-to-the-place",
      kind: "change",
      title: "Go to the place",
      text: [
        "`wait` lets beats go by. It does not go to a place. Here it waits 48 beats more, and the light comes late.",
        "Mend it with `at`: the south side should come on just when the chorus starts.",
      ],
      starter:
        'square.side("north").fadeTo(40, 8);\nwait(16);\nconst chorus = song.section("chorus");\nwait(48);\nsquare.side("south").on();\n',
      aim: 'square.side("north").fadeTo(40, 8);\nconst chorus = song.section("chorus");\nat(chorus.start, () => square.side("south").on());\n',
      checks: [
        {
          id: "not-before",
          kind: "dark",
          lights: { side: "south" },
          atBeat: 47.5,
          text: "The south side is dark just before the chorus.",
          hint: "The chorus starts at beat 48.",
        },
        {
          id: "on-time",
          kind: "lit",
          lights: { side: "south" },
          atBeat: 48.25,
          text: "The south side is lit when the chorus starts.",
          hint: 'Write `at(chorus.start, () => square.side("south").on());`.',
        },
        {
          id: "asks-the-song",
          kind: "word",
          word: "start",
          atLeast: 1,
          text: "The script asks the song for the place.",
          hint: "Use `chorus.start`. Then it works in every song.",
        },
      ],
      solution:
        'square.side("north").fadeTo(40, 8);\nconst chorus = song.section("chorus");\nat(chorus.start, () => square.side("south").on());\n',
    },
    {
      id: "low-and-high",
      kind: "change",
      title: "Low and high",
      text: [
        "The verse should be dim and the chorus bright. At the end of the chorus all fades out.",
        "Two lines are ready. Add the third: at `chorus.end`, fade all to 0 in 4 beats. Then make the chorus 90 in place of 20.",
      ],
      starter:
        'const verse = song.section("verse");\nconst chorus = song.section("chorus");\nat(verse.start, () => square.all.fadeTo(20, 4));\nat(chorus.start, () => square.all.fadeTo(20, 4));\n',
      aim: TWO_MOODS,
      checks: [
        {
          id: "bright",
          kind: "lit",
          lights: { front: "tree" },
          atBeat: 60,
          atLeast: 80,
          text: "The tree is bright in the chorus.",
          hint: "The chorus fades to 90.",
        },
        {
          id: "dark-after",
          kind: "dark",
          lights: {},
          atBeat: 86,
          text: "All is dark after the chorus.",
          hint: "Add `at(chorus.end, () => square.all.fadeTo(0, 4));`.",
        },
        {
          id: "like-the-aim",
          kind: "same-as-aim",
          text: "Your ribbon looks like the aim.",
          hint: "Each fade takes 4 beats.",
        },
      ],
      solution: TWO_MOODS,
    },
    {
      id: "your-song",
      kind: "make",
      title: "A show with two moods",
      text: [
        "Make a show in which the verse and the chorus look different. Choose a mood for each one first, and write it in a comment.",
        'Use `at` with at least two places or lists of the song. Let something happen after beat 96 too: `song.section("chorus", 2)` is the second chorus.',
      ],
      starter: '// Verse: quiet. Chorus: ...\nconst verse = song.section("verse");\n',
      checks: [
        {
          id: "two-ats",
          kind: "word",
          word: "at",
          atLeast: 2,
          text: "The script uses `at` two times or more.",
          hint: "One `at` for the verse and one for the chorus.",
        },
        {
          id: "sections",
          kind: "word",
          word: "section",
          atLeast: 2,
          text: "The script asks for two sections or more.",
          hint: 'Add `const chorus = song.section("chorus");`.',
        },
        {
          id: "colours",
          kind: "colours-seen",
          atLeast: 2,
          text: "At least two colours can be seen.",
          hint: "Give each mood a colour of its own.",
        },
        {
          id: "late",
          kind: "lasts-until",
          beat: 96,
          text: "Something still changes at beat 96 or later.",
          hint: 'Use `song.section("chorus", 2)`.',
        },
      ],
      solution:
        '// Verse: quiet and blue. Chorus: warm and wide.\nconst verse = song.section("verse");\nat(verse.bars, () => square.side("north").pulse(4, "skyblue"));\nfor (const nth of [1, 2]) {\n  const chorus = song.section("chorus", nth);\n  at(chorus.bars, () => {\n    square.fronts.pulse(4, "gold");\n  });\n}\n',
    },
  ],
  teacherNotes: [
    "Plan for 40 minutes: 5 to listen to the song and clap its bars; 7 for predict and run; 5 to investigate; 15 for the three changes; 6 for their own show; 2 to look at two ribbons beside each other.",
    "Listen once without lights. Clap the first beat of each bar. Hands up when the chorus comes. Then find the same places in the ribbon.",
    "Watch for `at(16, square.all.off())`. It runs at once. With `() =>` in front it is kept for later. Let them say it aloud: at beat 16, do this.",
    "Watch for `wait(chorus.start)`. `wait` counts from now, a place counts from the start of the song.",
    "Watch for a number inside `at(song.bars, ...)` that is meant to move along with the bars. In the action, the clock is at the bar already: just act.",
    "`at` sets the clock back when it is done. So the order of the lines does not matter, and two layers can be written one below the other.",
    "Good questions: Where is the clock in this line? How long is this list? What changes if the class picks another song?",
    "Done early: use the turn number, as in `at(chorus.bars, (turn) => ...)`, to change the colour with every second bar.",
  ],
};
