import type { CommentAnchor } from "../../../../shared/contracts/marking.ts";

/** What has become of the shows of the demo world: handed in, commented, marked, forwarded. */

export interface DemoComment {
  /** A key of staff ("marlow") or of a student ("7B-TARN/wren"). */
  readonly by: string;
  readonly anchor: CommentAnchor;
  readonly body: string;
}

export interface DemoMark {
  /** Level of every criterion of the assignment's rubric, in its order: 1 to 4. */
  readonly levels: readonly [number, number, number, number];
  readonly note: string;
}

export interface DemoForward {
  /** "scheduled" is an approved show that has a place in the lineup. */
  readonly state: "waiting" | "approved" | "declined" | "scheduled";
  readonly note: string;
  /** The coordinator's words; always there when declined. */
  readonly answer?: string;
}

export interface DemoWork {
  /** Key of the assignment. */
  readonly assignment: string;
  readonly scriptId: string;
  /** "working": begun and not handed in. */
  readonly state: "working" | "submitted" | "revise" | "marked";
  /** Day of the hand-in that counts; null while working. Days as in `assignments.ts`. */
  readonly handedInDay: number | null;
  readonly isLate?: boolean;
  /** Versions handed in before, oldest first; the last version is the script itself. */
  readonly earlier?: readonly string[];
  readonly comments?: readonly DemoComment[];
  /** Only when marked; released to the student. */
  readonly mark?: DemoMark;
  readonly forward?: DemoForward;
}

const whole: CommentAnchor = { kind: "whole" };
const line = (from: number, to = from): CommentAnchor => ({ kind: "lines", from, to });
const moment = (beat: number): CommentAnchor => ({ kind: "moment", tick: beat * 960 });
const marlow = (anchor: CommentAnchor, body: string): DemoComment => ({ by: "marlow", anchor, body });
const bahar = (anchor: CommentAnchor, body: string): DemoComment => ({ by: "bahar", anchor, body });

const FOXES_1 = 'for (const front of square.side("north")) {\n  front.colour("orange").pulse(2);\n  wait(1);\n}\n';
const FOXES_2 =
  'const trail = square.fronts.first(20);\nfunction fox(turn) {\n  trail.inTurn(1, (front) => {\n    front.colour("orange").pulse(1.5);\n  });\n}\nrepeat(9, (turn) => {\n  at(song.bar(5) + turn * 4, () => fox(turn));\n});\n';
const CALM_1 = 'at(song.bars, (turn) => {\n  square.side("north").fadeTo(turn * 3, 4);\n});\n';

export const WORK: readonly DemoWork[] = [
  {
    assignment: "a-show-with-a-chorus",
    scriptId: "nine-foxes",
    state: "marked",
    handedInDay: -8,
    earlier: [FOXES_1, FOXES_2],
    comments: [
      marlow(line(6), "Good idea to make the speed a name. What is the speed of the ninth fox?"),
      { by: "7B-TARN/wren", anchor: line(6), body: "1 - 8 * 0.08 is 0.36. So it is nearly three times as fast!" },
      marlow(moment(52), "Here three foxes are out at once and the street is at its best."),
      marlow(line(31), "Every second window on the drum: lovely. Say in a comment why 2."),
    ],
    mark: { levels: [3, 4, 3, 4], note: "The foxes really run. For the next show: what wakes them in bars 1 to 4?" },
    forward: {
      state: "scheduled",
      note: "Two who planned it on paper first. Runs clean, and the chorus is easy to see.",
      answer: "We would like it on Friday.",
    },
  },
  {
    assignment: "a-show-with-a-chorus",
    scriptId: "bells-up-the-north-side",
    state: "marked",
    handedInDay: -9,
    comments: [
      marlow(line(14, 16), "One loop for three choruses. This saves you twelve lines."),
      marlow(moment(160), "The bridge turns blue here. Did you choose blue, or did it happen?"),
    ],
    mark: { levels: [4, 3, 4, 3], note: "You can hear this show with the sound off." },
    forward: { state: "scheduled", note: "Ada's first show with sections. Good from far away." },
  },
  { assignment: "a-show-with-a-chorus", scriptId: "paper-moths", state: "submitted", handedInDay: -6, isLate: true },
  { assignment: "a-show-with-a-chorus", scriptId: "lost-brace", state: "working", handedInDay: null },
  {
    assignment: "twelve-bars-of-calm",
    scriptId: "twelve-bars-of-calm",
    state: "revise",
    handedInDay: -3,
    earlier: [CALM_1],
    comments: [
      marlow(line(4), "Calm and clear. After bar 13 nothing new happens for almost a minute. What could wake up?"),
      marlow(whole, "Read it again with the song playing, and hand it in by Friday."),
    ],
  },
  {
    assignment: "twelve-bars-of-calm",
    scriptId: "slow-snow",
    state: "marked",
    handedInDay: -5,
    comments: [
      marlow(line(2), "You leave the slow boxes out, and you know why. Tell the class about it."),
      marlow(moment(60), "People will stop walking here."),
    ],
    mark: { levels: [4, 4, 3, 3], note: "The calmest show of the class, and the one that everybody looked at." },
    forward: { state: "scheduled", note: "Very calm. Good between two loud ones." },
  },
  {
    assignment: "twelve-bars-of-calm",
    scriptId: "frost-letters",
    state: "marked",
    handedInDay: -4,
    comments: [marlow(line(9), "A function with two parameters, called five times. Well done.")],
    mark: { levels: [3, 4, 4, 2], note: "The letters can be read from the gallery steps. I tried it with a map." },
    forward: { state: "scheduled", note: "Letters made of fronts. No public name, please: the family has said no." },
  },
  {
    assignment: "twelve-bars-of-calm",
    scriptId: "a-kite-in-december",
    state: "marked",
    handedInDay: -4,
    comments: [marlow(line(6), "`path` and `shade` are good names for parameters.")],
    mark: { levels: [3, 4, 3, 3], note: "There and back again, each time in another colour." },
    forward: {
      state: "approved",
      note: "A clear picture that small children will see.",
      answer: "Lovely. We are looking for a night.",
    },
  },
  {
    assignment: "twelve-bars-of-calm",
    scriptId: "fair-without-rain",
    state: "marked",
    handedInDay: -2,
    comments: [
      marlow(
        line(8),
        "The dice decides how long a stall is open. Run it with another luck and see if you still like it.",
      ),
    ],
    mark: { levels: [2, 3, 4, 3], note: "The whole square takes part. Now let it listen to the song." },
    forward: {
      state: "declined",
      note: "Arlo would love to see it on the square.",
      answer:
        "The awnings of the ironmonger are out of order this month. Could it end without them? Then send it again.",
    },
  },
  { assignment: "twelve-bars-of-calm", scriptId: "right-now", state: "submitted", handedInDay: -2 },
  { assignment: "twelve-bars-of-calm", scriptId: "much-too-long", state: "submitted", handedInDay: -2 },
  { assignment: "twelve-bars-of-calm", scriptId: "too-bright", state: "submitted", handedInDay: -1, isLate: true },
  { assignment: "twelve-bars-of-calm", scriptId: "hundred-bars", state: "working", handedInDay: null },
  { assignment: "twelve-bars-of-calm", scriptId: "empty-page", state: "working", handedInDay: null },
  { assignment: "one-song-two-moods", scriptId: "one-song-two-moods", state: "submitted", handedInDay: -1 },
  {
    assignment: "one-song-two-moods",
    scriptId: "two-trains",
    state: "marked",
    handedInDay: -2,
    comments: [marlow(line(14, 17), "`together` is the right word here. Where do they meet the first time?")],
    mark: { levels: [3, 4, 3, 4], note: "Two trains, one clock. A clean piece of work." },
    forward: { state: "scheduled", note: "Two lights that meet. Needs the whole square." },
  },
  {
    assignment: "one-song-two-moods",
    scriptId: "lightning",
    state: "submitted",
    handedInDay: -1,
    comments: [{ by: "7B-TARN/kofi", anchor: whole, body: "it says 1 stop but it is the best one" }],
  },
  {
    assignment: "one-song-two-moods",
    scriptId: "not-called",
    state: "revise",
    handedInDay: -2,
    comments: [marlow(line(5, 6), "You name `flash` here, but you do not run it. What has to stand after the name?")],
  },
  { assignment: "ten-fronts-ten-turns", scriptId: "ten-small-suns", state: "working", handedInDay: null },
  {
    assignment: "ten-fronts-ten-turns",
    scriptId: "ice-on-the-millpond",
    state: "marked",
    handedInDay: -1,
    comments: [marlow(line(7), "Every seventh pixel, and it moves on with each turn. How did you find 7?")],
    mark: { levels: [4, 4, 3, 4], note: "The ice cracks where the fiddle jumps. I had not heard that before." },
    forward: { state: "waiting", note: "Uses both strips. Calm from afar, full of detail from near." },
  },
  {
    assignment: "a-dance-in-three",
    scriptId: "tea-room-waltz",
    state: "revise",
    handedInDay: -6,
    comments: [
      marlow(moment(49), "Roofs on one, doors on two and three. This is the waltz."),
      marlow(line(15), "The first verse is nearly dark. Could one more front join in?"),
    ],
  },
  {
    assignment: "a-dance-in-three",
    scriptId: "lantern-walk",
    state: "marked",
    handedInDay: -7,
    comments: [marlow(line(7, 13), "Higher goes on, lower goes back. Could a classmate read this without you?")],
    mark: { levels: [4, 3, 3, 3], note: "The lantern follows the flute note by note." },
    forward: { state: "scheduled", note: "Quiet and clever. Best early in the evening." },
  },
  {
    assignment: "loud-and-soft",
    scriptId: "hush-then-drums",
    state: "marked",
    handedInDay: -5,
    comments: [marlow(line(7), "Where does the 55 come from? Print a few values and look.")],
    mark: { levels: [4, 3, 3, 2], note: "Now mend the warnings about the slow boxes, and it is ready." },
    forward: {
      state: "approved",
      note: "Rafi has looked at every bar.",
      answer: "Welcome. The drums will sound well on Saturday.",
    },
  },
  { assignment: "showpiece", scriptId: "ferry-at-six", state: "submitted", handedInDay: 0 },
  {
    assignment: "once-round-the-square",
    scriptId: "slow-then-quick",
    state: "marked",
    handedInDay: -4,
    comments: [
      { by: "okafor", anchor: line(1, 2), body: "Two names instead of numbers everywhere. That is what they are for." },
    ],
    mark: { levels: [3, 4, 3, 3], note: "Round three times, and each time it is different." },
  },
  { assignment: "once-round-the-square", scriptId: "chess", state: "submitted", handedInDay: -3 },
  { assignment: "once-round-the-square", scriptId: "coin-toss", state: "submitted", handedInDay: -3 },
  {
    assignment: "layers",
    scriptId: "four-bands",
    state: "marked",
    handedInDay: -7,
    comments: [
      { by: "lindqvist", anchor: line(1, 5), body: "A table of sides by instrument. It makes the rest short." },
    ],
    mark: { levels: [4, 3, 4, 3], note: "Each side plays its own part." },
    forward: { state: "waiting", note: "Four sides, four players." },
  },
  { assignment: "layers", scriptId: "patchwork", state: "submitted", handedInDay: -7 },
  {
    assignment: "windows-and-doors",
    scriptId: "ladders",
    state: "marked",
    handedInDay: -10,
    comments: [
      bahar(line(3, 7), "I can see the ladder stand up. The loop counts the rounds, not the fronts. Well found."),
    ],
    mark: { levels: [3, 4, 4, 3], note: "Four ladders at a time, all round the square." },
    forward: { state: "scheduled", note: "Mei thought of it on the way to school." },
  },
  {
    assignment: "windows-and-doors",
    scriptId: "window-by-window",
    state: "marked",
    handedInDay: -9,
    comments: [bahar(moment(120), "The breathing is beautiful. Do all windows have to breathe together?")],
    mark: { levels: [3, 3, 4, 4], note: "Somebody goes home in this show. I could nearly see them." },
    forward: { state: "scheduled", note: "Calm. The family prefers no name." },
  },
  {
    assignment: "a-street-with-a-story",
    scriptId: "the-bakers-kettle",
    state: "marked",
    handedInDay: -8,
    comments: [bahar(line(5, 9), "`heat` tells the whole story of the first minute.")],
    mark: { levels: [3, 3, 4, 3], note: "The kettle whistles and the town wakes up." },
    forward: { state: "scheduled", note: "A story that can be followed without words." },
  },
  {
    assignment: "a-street-with-a-story",
    scriptId: "the-long-hallway",
    state: "marked",
    handedInDay: -7,
    comments: [bahar(line(1), "Two names for two halves in one line.")],
    mark: { levels: [4, 4, 3, 3], note: "Two people walk towards each other, three times." },
    forward: {
      state: "approved",
      note: "Jasper's first show for the event.",
      answer: "Welcome. We are looking for a night.",
    },
  },
  {
    assignment: "night-birds",
    scriptId: "half-past-owl",
    state: "marked",
    handedInDay: -6,
    comments: [
      bahar(line(5, 10), "`look` works for either eye. This is what parameters are for."),
      bahar(moment(30), "It looked at me."),
    ],
    mark: { levels: [4, 4, 3, 4], note: "An owl in twenty lines." },
    forward: { state: "scheduled", note: "Slow and funny. No public name." },
  },
];
