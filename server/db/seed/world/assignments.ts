import type { AssignmentFields } from "../../../../shared/contracts/assignments.ts";
import type { ClassCode } from "./class-lists.ts";
import { FIRST_RUBRIC, SONG_RUBRIC } from "./rubrics.ts";

/** An assignment of the demo world. Days count from the day that the world is seeded: -3 is three days ago. */
export interface DemoAssignment extends Omit<AssignmentFields, "dueAt"> {
  readonly key: string;
  readonly classCode: ClassCode;
  readonly setDay: number;
  readonly dueDay: number;
  /** Local time of day at which it is due: "15:30". */
  readonly dueTime: string;
}

export const ASSIGNMENTS: readonly DemoAssignment[] = [
  {
    key: "a-show-with-a-chorus",
    classCode: "7B-TARN",
    title: "A show with a chorus",
    songId: "quillhaven-bells",
    setDay: -21,
    dueDay: -7,
    dueTime: "15:30",
    lateRule: "accept-late",
    brief:
      "Write a show for Quillhaven Bells. When the chorus comes, people should see it without hearing it. Use at least one function of your own, and something from the song. You may work in pairs.",
    requirements: [
      { kind: "function", atLeast: 1 },
      { kind: "song-data", atLeast: 1 },
    ],
    rubric: SONG_RUBRIC,
  },
  {
    key: "twelve-bars-of-calm",
    classCode: "7B-TARN",
    title: "Twelve bars of calm",
    songId: "frost-fair",
    setDay: -16,
    dueDay: -2,
    dueTime: "15:30",
    lateRule: "accept-late",
    brief:
      "Not every show has to be loud. Begin with twelve calm bars: slow fades, few colours. After that the show may wake up. It should last until the song ends.",
    requirements: [{ kind: "loop", atLeast: 1 }],
    rubric: SONG_RUBRIC,
  },
  {
    key: "one-song-two-moods",
    classCode: "7B-TARN",
    title: "One song, two moods",
    songId: "jingle-bells",
    setDay: -9,
    dueDay: -1,
    dueTime: "15:30",
    lateRule: "closed",
    brief:
      "Give the verse and the chorus of the song two different moods. Choose the moods first and write them in a comment at the top. Then find colours and speeds for them.",
    requirements: [
      { kind: "loop", atLeast: 2 },
      { kind: "song-data", atLeast: 1 },
    ],
    rubric: SONG_RUBRIC,
  },
  {
    key: "ten-fronts-ten-turns",
    classCode: "7B-TARN",
    title: "Ten fronts, ten turns",
    songId: "skaters-jig",
    setDay: -4,
    dueDay: 3,
    dueTime: "15:30",
    lateRule: "accept-late",
    brief:
      "Choose one side of the square. Each of its ten fronts gets a turn, and no two turns look the same. A loop in a loop can help.",
    requirements: [{ kind: "loop", atLeast: 1 }],
    rubric: SONG_RUBRIC,
  },
  {
    key: "a-dance-in-three",
    classCode: "7B-TARN",
    title: "A dance in three",
    songId: "lantern-waltz",
    setDay: -18,
    dueDay: -5,
    dueTime: "15:30",
    lateRule: "accept-late",
    brief:
      "A waltz has three beats in a bar, and the first one is strong. Show that on the square. Take care with the one beat before bar 1.",
    requirements: [{ kind: "song-data", atLeast: 1 }],
    rubric: SONG_RUBRIC,
  },
  {
    key: "loud-and-soft",
    classCode: "7B-TARN",
    title: "Loud and soft",
    songId: "good-king-wenceslas",
    setDay: -12,
    dueDay: -4,
    dueTime: "15:30",
    lateRule: "accept-late",
    brief:
      "Let the lights follow how loud the song is. `howLoud` tells you. Decide what loud looks like: brighter, more fronts, or another colour?",
    requirements: [
      { kind: "condition", atLeast: 1 },
      { kind: "song-data", atLeast: 1 },
    ],
    rubric: SONG_RUBRIC,
  },
  {
    key: "showpiece",
    classCode: "7B-TARN",
    title: "Showpiece",
    songId: "frost-fair",
    setDay: -1,
    dueDay: 14,
    dueTime: "15:30",
    lateRule: "accept-late",
    brief:
      "This is your own show for the town. Use what you have learned. Plan it on paper first: one line for each section of the song. The best ones are forwarded to the event.",
    requirements: [
      { kind: "function-with-parameters", atLeast: 1 },
      { kind: "list", atLeast: 1 },
      { kind: "song-data", atLeast: 1 },
    ],
    rubric: SONG_RUBRIC,
  },
  {
    key: "once-round-the-square",
    classCode: "7A-TARN",
    title: "Once round the square",
    songId: "good-king-wenceslas",
    setDay: -10,
    dueDay: -3,
    dueTime: "14:15",
    lateRule: "accept-late",
    brief:
      "Take the light for a walk round the square. It should come back to where it started. Use `for..of` or a counting loop.",
    requirements: [{ kind: "loop", atLeast: 1 }],
    rubric: FIRST_RUBRIC,
  },
  {
    key: "layers",
    classCode: "8A-TARN",
    title: "Layers",
    songId: "jingle-bells",
    setDay: -14,
    dueDay: -6,
    dueTime: "13:00",
    lateRule: "closed",
    brief:
      "A show with at least two layers that do not disturb each other. One could follow the bars, the other an instrument.",
    requirements: [
      { kind: "list", atLeast: 1 },
      { kind: "song-data", atLeast: 1 },
    ],
    rubric: SONG_RUBRIC,
  },
  {
    key: "windows-and-doors",
    classCode: "7K-QUILL",
    title: "Windows and doors",
    songId: "quillhaven-bells",
    setDay: -20,
    dueDay: -8,
    dueTime: "16:00",
    lateRule: "accept-late",
    brief:
      "Fronts have parts. Write a show in which windows, doors and roofs do different things. A loop in a loop is worth a try.",
    requirements: [{ kind: "loop", atLeast: 2 }],
    rubric: SONG_RUBRIC,
  },
  {
    key: "a-street-with-a-story",
    classCode: "7K-QUILL",
    title: "A street with a story",
    songId: "good-king-wenceslas",
    setDay: -17,
    dueDay: -6,
    dueTime: "16:00",
    lateRule: "accept-late",
    brief:
      "Who lives in the street? Something happens to them this evening. Tell it with light only. Two sentences at the top say what the story is.",
    requirements: [{ kind: "loop", atLeast: 1 }],
    rubric: SONG_RUBRIC,
  },
  {
    key: "night-birds",
    classCode: "7K-QUILL",
    title: "Night birds",
    songId: "lantern-waltz",
    setDay: -15,
    dueDay: -5,
    dueTime: "16:00",
    lateRule: "accept-late",
    brief:
      "Choose a bird or another creature of the night and let the square move as it does. Use functions with parameters.",
    requirements: [{ kind: "function-with-parameters", atLeast: 1 }],
    rubric: SONG_RUBRIC,
  },
];
