import type { Rubric } from "../../../../shared/contracts/assignments.ts";

type LevelTexts = readonly [string, string, string, string];

const LEVEL_NAMES = ["not yet", "nearly", "yes", "and more"] as const;

function criterion(id: string, name: string, texts: LevelTexts): Rubric[number] {
  return { id, name, levels: LEVEL_NAMES.map((level, n) => ({ name: level, text: texts[n] ?? "" })) };
}

const SQUARE = criterion("square", "Uses the square", [
  "One or two fronts are lit, and the rest of the square has no part in it.",
  "Several fronts are lit, but on one side only, or all in the same way.",
  "At least two sides take part, and different parts of fronts do different things.",
  "The whole square tells one story. Even dark places are there for a reason.",
]);

const READY = criterion("ready", "Safe and ready for the square", [
  "The script does not run, or the show check has a stop.",
  "It runs, but the show check has warnings that can be mended.",
  "It runs from start to end of the song. What warnings are left are meant.",
  "It runs, has no warnings, and somebody else could read and change it.",
]);

/** For shows that follow a song. */
export const SONG_RUBRIC: Rubric = [
  criterion("song", "Fits the song", [
    "The lights change without any link to the song.",
    "Some changes come with the song, others miss it.",
    "The sections of the song can be told apart with the sound off.",
    "The show makes you hear something in the song that you had missed.",
  ]),
  criterion("code", "Uses a loop or a function well", [
    "Lines are copied where a loop would do.",
    "There is a loop or a function, but it is not needed or hard to follow.",
    "Loops or functions do the work, and their names say what they do.",
    "Functions with parameters are used again and again, with other values.",
  ]),
  SQUARE,
  READY,
];

/** For the first shows of a class. */
export const FIRST_RUBRIC: Rubric = [
  criterion("order", "Things happen in order", [
    "All changes come at the same time.",
    "Some waits are there, but some changes can not be seen.",
    "Every change can be seen, one after the other.",
    "The waits are chosen to fit the song, and a note says how.",
  ]),
  criterion("code", "Says it once", [
    "Every front has lines of its own.",
    "A variable or a loop is there, but lines are still copied.",
    "Loops do what is done many times. Variables hold what may change.",
    "To change a colour or a wait, one place is enough.",
  ]),
  SQUARE,
  READY,
];
