/**
 * The icon set, drawn on a 24 unit grid in the manner of cut paper: `sheet` is a closed piece laid
 * under the line at low strength, `cut` is the line, `solid` is a piece at full strength.
 */
export interface IconShape {
  sheet?: string;
  cut?: string;
  solid?: string;
}

const ringed = "M12 3.5a8.5 8.5 0 1 1 0 17a8.5 8.5 0 0 1 0-17z";
const bubble = "M4 5h16v11h-9l-4 4v-4H4z";
const octagon = "M8.5 3.5h7l5 5v7l-5 5h-7l-5-5v-7z";
const gable = "M12 4.5 21 19.5H3z";
const speaker = "M4 10v4h3.5L12 18V6L7.5 10z";
const sheetOfPaper = "M6 3.5h8l4 4v13H6z";
const padlock = "M5.5 10.5h13v9.5h-13z";

const shapes = {
  // places
  home: { sheet: "M6.5 9.5 12 5l5.5 4.5V20h-11z", cut: "M3.5 11.5 12 4l8.5 7.5M6.5 9.5V20h11V9.5M10 20v-5.5h4V20" },
  book: {
    sheet: "M12 6.5C10 5 7 4.6 4 5v13c3-.4 6 0 8 1.5z",
    cut: "M12 6.5C10 5 7 4.6 4 5v13c3-.4 6 0 8 1.5 2-1.5 5-1.9 8-1.5V5c-3-.4-6 0-8 1.5zM12 6.5v13",
  },
  ribbon: { sheet: "M3 6h18l-2 3 2 3H3l2-3z", cut: "M3 6h18l-2 3 2 3H3l2-3zM3 15h18l-1.5 2 1.5 2H3l1.5-2z" },
  street: { sheet: "M9 20V7h5v13z", cut: "M3 20V11l3-3 3 3v9M9 20V7h5v13M14 20v-8l3.5-3L21 12v8M2.5 20h19" },
  school: { sheet: "M4 11h16v9H4z", cut: "M4 20v-9l8-5 8 5v9zM12 6V2.5h4M10 20v-4.5h4V20M7 13.5h1.5M15.5 13.5H17" },
  tree: { sheet: "m12 3 6 15H6z", cut: "m12 3 3.5 5.5H14L17 13h-1.5l2.5 5H6l2.5-5H7l3-4.5H8.5zM12 18v3" },
  place: {
    sheet: "M12 21c4-5 6-8 6-11a6 6 0 0 0-12 0c0 3 2 6 6 11z",
    cut: "M12 21c4-5 6-8 6-11a6 6 0 0 0-12 0c0 3 2 6 6 11zM12 8a2 2 0 1 1 0 4a2 2 0 0 1 0-4z",
  },
  bell: {
    sheet: "M12 4c3.5 0 5.5 2.5 5.5 6v4l2 3.5h-15l2-3.5v-4c0-3.5 2-6 5.5-6z",
    cut: "M12 2.5V4c3.5 0 5.5 2.5 5.5 6v4l2 3.5h-15l2-3.5v-4c0-3.5 2-6 5.5-6M10 20.5h4",
  },
  moon: {
    sheet: "M19 14.5A8 8 0 1 1 10 4.5a6.5 6.5 0 0 0 9 10z",
    cut: "M19 14.5A8 8 0 1 1 10 4.5a6.5 6.5 0 0 0 9 10z",
  },
  // playing
  play: { solid: "M8 5v14l11-7z" },
  pause: { solid: "M7 5h3.5v14H7zM13.5 5H17v14h-3.5z" },
  "stop-playing": { solid: "M6 6h12v12H6z" },
  loop: { cut: "M5 11V7.5h13M15 4l3.5 3.5L15 11M19 13v3.5H6M9 13l-3.5 3.5L9 20" },
  rewind: { cut: "M11 7 6 12l5 5M18 7l-5 5 5 5" },
  "to-start": { solid: "M18 6 9.5 12l8.5 6z", cut: "M6.5 6v12" },
  forward: { cut: "m13 7 5 5-5 5M6 7l5 5-5 5" },
  volume: { sheet: speaker, cut: `${speaker}M15.5 9a4.5 4.5 0 0 1 0 6M18 6.5a8 8 0 0 1 0 11` },
  mute: { sheet: speaker, cut: `${speaker}M15.5 9.5l5 5M20.5 9.5l-5 5` },
  music: {
    solid: "M9.5 18a2.75 2.25 0 1 1-5.5 0a2.75 2.25 0 0 1 5.5 0zM19 16a2.75 2.25 0 1 1-5.5 0a2.75 2.25 0 0 1 5.5 0z",
    cut: "M9.5 18V7L19 5v11M9.5 10.5 19 8.5",
  },
  gentle: { cut: "M3.5 14.5c2.8 0 2.8-5 5.7-5s2.8 5 5.6 5 2.9-5 5.7-5" },
  metronome: { sheet: "M8.5 4h7L19 20.5H5z", cut: "M8.5 4h7L19 20.5H5zM6 15.5h12M12 15.5 17.5 6" },
  // states
  check: { cut: "m5 12.5 4.5 4.5L19 7.5" },
  tick: { sheet: ringed, cut: `${ringed}m-4 8.8 2.8 2.8L16 9.5` },
  cross: { cut: "m6.5 6.5 11 11m0-11-11 11" },
  pencil: { sheet: "M5 19l1-4L16 5l3 3L9 18z", cut: "M5 19l1-4L16 5l3 3L9 18zM14 7l3 3" },
  turn: { cut: "M19 12a7 7 0 1 1-2.2-5.1M19 3.5V8h-4.5" },
  sent: { cut: "M12 20V5.5M6.5 11 12 5.5l5.5 5.5" },
  clock: { sheet: ringed, cut: `${ringed}M12 7v5l3.2 2` },
  calendar: { sheet: "M4 6h16v4.5H4z", cut: "M4 6h16v14H4zM4 10.5h16M8.5 3.5v4M15.5 3.5v4" },
  warn: { sheet: gable, cut: `${gable}M12 10v4M12 16.8v.1` },
  stop: { sheet: octagon, cut: `${octagon}M12 7.5v5.5M12 16v.1` },
  info: { sheet: ringed, cut: `${ringed}M12 11.5v5M12 8v.1` },
  help: { sheet: ringed, cut: `${ringed}M9.5 10a2.5 2.5 0 1 1 3.7 2.2c-.8.5-1.2.9-1.2 1.8M12 16.7v.1` },
  knot: { cut: "M3 16c4.5 0 4.5-8 9-8 3 0 4.5 2 4.5 4s-1.5 4-4.5 4c-4.5 0-4.5-8-9-8M16.5 12H21" },
  hand: {
    sheet:
      "M7.5 12V6.4a1.4 1.4 0 0 1 2.8 0V4.6a1.4 1.4 0 0 1 2.8 0v1a1.4 1.4 0 0 1 2.8 0v7.9c0 3.7-1.9 6.5-5 6.5-2.5 0-3.8-1.2-5.2-3.6L4.2 13.6c-.7-1.3.9-2.3 1.9-1.3z",
    cut: "M7.5 12V6.4a1.4 1.4 0 0 1 2.8 0V11 4.6a1.4 1.4 0 0 1 2.8 0V11 5.6a1.4 1.4 0 0 1 2.8 0v7.9c0 3.7-1.9 6.5-5 6.5-2.5 0-3.8-1.2-5.2-3.6L4.2 13.6c-.7-1.3.9-2.3 1.9-1.3z",
  },
  flag: { sheet: "M6 4.5h13l-3 4 3 4H6z", cut: "M6 21V4.5h13l-3 4 3 4H6" },
  bolt: { sheet: "M13 3 6 13.5h5L10 21l7.5-11h-5z", cut: "M13 3 6 13.5h5L10 21l7.5-11h-5z" },
  away: {
    cut: "M4 4l16 16M8 8.5C5.5 9.5 4 12 4 12s3 5.5 8 5.5c1.3 0 2.5-.4 3.5-.9M11 6.6l1-.1c5 0 8 5.5 8 5.5s-.8 1.5-2.3 3",
  },
  // acts
  plus: { cut: "M12 5v14M5 12h14" },
  minus: { cut: "M5 12h14" },
  search: {
    sheet: "M11 5a6 6 0 1 1 0 12a6 6 0 0 1 0-12z",
    cut: "M11 5a6 6 0 1 1 0 12a6 6 0 0 1 0-12zM15.5 15.5 20 20",
  },
  undo: { cut: "M8.5 4.5 4 9l4.5 4.5M4.5 9H14a5 5 0 0 1 0 10h-4" },
  redo: { cut: "M15.5 4.5 20 9l-4.5 4.5M19.5 9H10a5 5 0 0 0 0 10h4" },
  trash: {
    sheet: "M6.5 8h11l-1 12.5h-9z",
    cut: "M6.5 8h11l-1 12.5h-9zM4 8h16M9.5 8V4.5h5V8M10.5 11.5v5.5M13.5 11.5v5.5",
  },
  download: { cut: "M12 4v11M6.5 10l5.5 5.5L17.5 10M4 16v4h16v-4" },
  upload: { cut: "M12 15.5V4.5M6.5 10 12 4.5l5.5 5.5M4 16v4h16v-4" },
  print: { sheet: "M4 8.5h16v8H4z", cut: "M7 8.5V4h10v4.5M7 16.5H4v-8h16v8h-3M7 14h10v6H7z" },
  send: { sheet: "M4 5l16 7-16 7 3-7z", cut: "M4 5l16 7-16 7 3-7zM7 12h12" },
  mail: { sheet: "M4 6h16v12H4z", cut: "M4 6h16v12H4zM4 7l8 6.5L20 7" },
  copy: { sheet: "M9 9h11v11H9z", cut: "M9 9h11v11H9zM6 15H4V4h11v2" },
  link: { cut: "M10 14.5l4.5-5M10.5 7.5 13 5a3.9 3.9 0 0 1 6 6l-2.5 2.5M13.5 16.5 11 19a3.9 3.9 0 0 1-6-6l2.5-2.5" },
  pin: { sheet: "M9 4h6l-1 6 3 3H7l3-3z", cut: "M9 4h6l-1 6 3 3H7l3-3zM12 13v7.5" },
  arrange: { cut: "M4 7h9M4 12h5M4 17h9M17 5v14M17 19l-3-3M17 19l3-3" },
  swap: { cut: "M4 8.5h15M15 4.5l4 4-4 4M20 15.5H5M9 11.5l-4 4 4 4" },
  filter: { sheet: "M4 5h16l-6 7.5V19l-4-2v-4.5z", cut: "M4 5h16l-6 7.5V19l-4-2v-4.5z" },
  settings: {
    cut: "M4 7h9M17 7h3M4 17h3M11 17h9",
    sheet: "M13 4.5h4v5h-4zM7 14.5h4v5H7z",
    solid: "M13.5 5h3v4h-3zM7.5 15h3v4h-3z",
  },
  history: { cut: "M4.5 12A8 8 0 1 0 7 6.2L4.5 8.5M4.5 4v4.5H9M12 7.5V12l3 2" },
  "zoom-in": {
    sheet: "M11 5a6 6 0 1 1 0 12a6 6 0 0 1 0-12z",
    cut: "M11 5a6 6 0 1 1 0 12a6 6 0 0 1 0-12zM15.5 15.5 20 20M11 8.5v5M8.5 11h5",
  },
  "zoom-out": {
    sheet: "M11 5a6 6 0 1 1 0 12a6 6 0 0 1 0-12z",
    cut: "M11 5a6 6 0 1 1 0 12a6 6 0 0 1 0-12zM15.5 15.5 20 20M8.5 11h5",
  },
  eye: {
    sheet: "M3 12c2.5-4.5 5.5-6.5 9-6.5s6.5 2 9 6.5c-2.5 4.5-5.5 6.5-9 6.5S5.5 16.5 3 12z",
    cut: "M3 12c2.5-4.5 5.5-6.5 9-6.5s6.5 2 9 6.5c-2.5 4.5-5.5 6.5-9 6.5S5.5 16.5 3 12zM12 9.5a2.5 2.5 0 1 1 0 5a2.5 2.5 0 0 1 0-5z",
  },
  lock: { sheet: padlock, cut: `${padlock}M8 10.5V8a4 4 0 0 1 8 0v2.5M12 14v2.5` },
  unlock: { sheet: padlock, cut: `${padlock}M8 10.5V7a4 4 0 0 1 7.5-2M12 14v2.5` },
  "sign-out": { cut: "M13 4H5v16h8M10 12h10M16 7.5l4.5 4.5-4.5 4.5" },
  external: { cut: "M18 13.5V20H4V6h6.5M14 4h6v6M19.5 4.5 11 13" },
  // wayfinding
  menu: { cut: "M4 7h16M4 12h16M4 17h16" },
  more: { solid: "M4.5 10.5h3v3h-3zM10.5 10.5h3v3h-3zM16.5 10.5h3v3h-3z" },
  grip: {
    solid:
      "M7.75 4.75h2.5v2.5h-2.5zM7.75 10.75h2.5v2.5h-2.5zM7.75 16.75h2.5v2.5h-2.5zM13.75 4.75h2.5v2.5h-2.5zM13.75 10.75h2.5v2.5h-2.5zM13.75 16.75h2.5v2.5h-2.5z",
  },
  "chevron-right": { cut: "m9 5.5 6.5 6.5L9 18.5" },
  "chevron-left": { cut: "M15 5.5 8.5 12l6.5 6.5" },
  "chevron-down": { cut: "M5.5 9 12 15.5 18.5 9" },
  "chevron-up": { cut: "M5.5 15 12 8.5l6.5 6.5" },
  "arrow-right": { cut: "M4 12h15M13 6l6 6-6 6" },
  "arrow-left": { cut: "M20 12H5M11 6l-6 6 6 6" },
  // things
  note: { sheet: bubble, cut: bubble },
  lamp: { sheet: "M9 10h6l1.5 7h-9z", cut: "M12 3v3M9 10h6l1.5 7h-9zM9.5 10a2.5 4 0 0 1 5 0M12 17v4" },
  bulb: {
    sheet: "M9 16c0-2-2.5-3-2.5-6.5a5.5 5.5 0 0 1 11 0C17.5 13 15 14 15 16z",
    cut: "M9 16c0-2-2.5-3-2.5-6.5a5.5 5.5 0 0 1 11 0C17.5 13 15 14 15 16zM9.5 19.5h5",
  },
  half: { cut: "M12 4a8 8 0 1 1 0 16a8 8 0 0 1 0-16z", solid: "M12 4v16a8 8 0 0 0 0-16z" },
  box: { sheet: "M5 5h14v5H5z", cut: "M5 5h14v14H5zM5 10h14M9 14.5h.1M12 14.5h.1M15 14.5h.1" },
  plug: { sheet: "M6.5 8h11v3a5.5 5.5 0 0 1-11 0z", cut: "M9 3.5V8M15 3.5V8M6.5 8h11v3a5.5 5.5 0 0 1-11 0zM12 16.5v4" },
  wire: { cut: "M3 6h7v12h11M3 5v2M21 17v2", solid: "M8.5 10.5h3v3h-3z" },
  people: {
    sheet: "M9 5.5a3 3 0 1 1 0 6a3 3 0 0 1 0-6zM3.5 19c0-3.5 2.5-5.5 5.5-5.5s5.5 2 5.5 5.5z",
    cut: "M9 5.5a3 3 0 1 1 0 6a3 3 0 0 1 0-6zM3.5 19.5c0-4 2.5-6 5.5-6s5.5 2 5.5 6M15 6a3 3 0 0 1 0 5.6M17 14c2.3.7 3.5 2.5 3.5 5.5",
  },
  person: {
    sheet: "M12 4a3.75 3.75 0 1 1 0 7.5a3.75 3.75 0 0 1 0-7.5zM5 20.5c0-4.5 3-6.5 7-6.5s7 2 7 6.5z",
    cut: "M12 4a3.75 3.75 0 1 1 0 7.5a3.75 3.75 0 0 1 0-7.5zM5 20.5c0-4.5 3-6.5 7-6.5s7 2 7 6.5z",
  },
  keyboard: { sheet: "M4 7h16v10H4z", cut: "M4 7h16v10H4zM7.5 10.5h.1M11 10.5h.1M14.5 10.5h.1M8.5 14h7" },
  card: { sheet: "M3.5 6h17v4h-17z", cut: "M3.5 6h17v12h-17zM3.5 10h17M7 14.5h4M15 14.5h2" },
  key: { sheet: "M8 8a4 4 0 1 1 0 8a4 4 0 0 1 0-8z", cut: "M8 8a4 4 0 1 1 0 8a4 4 0 0 1 0-8zM12 12h9v4M17 12v3" },
  page: { sheet: sheetOfPaper, cut: `${sheetOfPaper}M14 3.5v4h4M9 12h6M9 15.5h6` },
  letters: { cut: "M3 18 7.5 6 12 18M4.5 14h6M14 18l3-8 3 8M15 15.5h4" },
  script: { sheet: sheetOfPaper, cut: `${sheetOfPaper}M10 10l-2 2.5 2 2.5M14 10l2 2.5-2 2.5` },
  list: { cut: "M9 6.5h11M9 12h11M9 17.5h11M4.5 6.5h.1M4.5 12h.1M4.5 17.5h.1" },
  rubric: { sheet: "M4 5h6v14H4z", cut: "M4 5h16v14H4zM10 5v14M4 9.7h16M4 14.3h16" },
  figures: {
    sheet: "M5 12h3.5v7.5H5zM15.5 9H19v10.5h-3.5z",
    cut: "M5 12h3.5v7.5H5zM10.3 5h3.5v14.5h-3.5zM15.5 9H19v10.5h-3.5z",
  },
  "square-open": { cut: "M6 6h12v12H6z" },
  "square-filled": { solid: "M5.5 5.5h13v13h-13z" },
  triangle: { solid: "M12 5 20 19H4z" },
  disc: { solid: "M12 5a7 7 0 1 1 0 14a7 7 0 0 1 0-14z" },
} satisfies Record<string, IconShape>;

export type IconName = keyof typeof shapes;

export const ICON_SHAPES: Record<IconName, IconShape> = shapes;

/** Every icon's name, in the order of the set. */
export const ICON_NAMES = Object.keys(shapes) as IconName[];
