import { PASSPHRASE_WORDS } from "../../../../shared/passphrase-words.ts";
import type { Role } from "../../../../shared/roles.ts";
import { hashText, numbersFrom } from "../../../../sandbox/square/stable-chance.ts";
import { CLASS_CODES, CLASS_LISTS } from "./class-lists.ts";
import type { ClassCode } from "./class-lists.ts";
import { SCHOOL_NAMES, TIME_ZONE } from "./figures.ts";

/** Everybody of the demo world. All names are invented; all secrets are printed here and open nothing real. */

export type SchoolKey = "tarn" | "quill";

export interface DemoSchool {
  readonly key: SchoolKey;
  readonly name: string;
  /** As the programme prints it: "Wren, Tarn Road". */
  readonly shortName: string;
  readonly timeZone: string;
}

export const SCHOOLS: readonly DemoSchool[] = [
  { key: "tarn", name: SCHOOL_NAMES[0], shortName: "Tarn Road", timeZone: TIME_ZONE },
  { key: "quill", name: SCHOOL_NAMES[1], shortName: "Intermediate", timeZone: TIME_ZONE },
];

export interface DemoStaff {
  /** A stable name for it within the demo world. */
  readonly key: string;
  readonly displayName: string;
  readonly email: string;
  readonly roles: readonly Role[];
  /** null: belongs to the event or to the installation. */
  readonly school: SchoolKey | null;
  /** At least 15 characters. */
  readonly password: string;
}

const at = (name: string): string => `${name}@quillhaven.example`;

export const STAFF: readonly DemoStaff[] = [
  {
    key: "marlow",
    displayName: "Ms Marlow",
    email: at("d.marlow"),
    roles: ["teacher"],
    school: "tarn",
    password: "seven lanterns by the bridge",
  },
  {
    key: "okafor",
    displayName: "Mr Okafor",
    email: at("c.okafor"),
    roles: ["teacher"],
    school: "tarn",
    password: "the old clock runs late again",
  },
  {
    key: "lindqvist",
    displayName: "Mrs Lindqvist",
    email: at("m.lindqvist"),
    roles: ["teacher"],
    school: "tarn",
    password: "two geese crossed the square",
  },
  {
    key: "bahar",
    displayName: "Ms Bahar",
    email: at("s.bahar"),
    roles: ["teacher"],
    school: "quill",
    password: "blue paper and a pair of scissors",
  },
  {
    key: "tremain",
    displayName: "Mr Tremain",
    email: at("j.tremain"),
    roles: ["teacher"],
    school: "quill",
    password: "nine ferries left before noon",
  },
  {
    key: "holm",
    displayName: "Petra Holm",
    email: at("p.holm"),
    roles: ["coordinator"],
    school: null,
    password: "every lamp is someones lamp",
  },
  {
    key: "quist",
    displayName: "Aron Quist",
    email: at("a.quist"),
    roles: ["admin"],
    school: null,
    password: "keep two copies in two places",
  },
];

export interface DemoClass {
  readonly code: ClassCode;
  readonly name: string;
  readonly school: SchoolKey;
  /** Keys of staff. */
  readonly teachers: readonly string[];
  /** Number of the lesson the class has come to; 0 before the first. */
  readonly lesson: number;
}

export const CLASSES: readonly DemoClass[] = [
  { code: "7B-TARN", name: "7B", school: "tarn", teachers: ["marlow"], lesson: 5 },
  { code: "7A-TARN", name: "7A", school: "tarn", teachers: ["marlow", "okafor"], lesson: 4 },
  { code: "8A-TARN", name: "8A", school: "tarn", teachers: ["lindqvist"], lesson: 6 },
  { code: "7K-QUILL", name: "7K", school: "quill", teachers: ["bahar"], lesson: 5 },
  { code: "8L-QUILL", name: "8L", school: "quill", teachers: ["tremain", "bahar"], lesson: 2 },
  { code: "6C-QUILL", name: "6C", school: "quill", teachers: ["tremain"], lesson: 1 },
];

/** Whether a family lets the first name be public: "yes", "no", or not answered yet. */
export type Consent = "yes" | "no" | "open";

export interface DemoStudent {
  /** Class code and username, as scripts and assignments name their authors: "7B-TARN/wren". */
  readonly key: string;
  readonly displayName: string;
  readonly username: string;
  readonly classCode: ClassCode;
  readonly school: SchoolKey;
  /** Four words with hyphens: the same for ever, so that a demo card can be printed. */
  readonly passphrase: string;
  readonly consent: Consent;
}

/** Answers that the demo's programme depends on. */
const ANSWERS: { readonly [key: string]: Consent } = {
  "7B-TARN/wren": "yes",
  "7B-TARN/idris": "yes",
  "7B-TARN/june": "yes",
  "7B-TARN/oren": "yes",
  "7B-TARN/fern": "yes",
  "7B-TARN/zoe": "no",
  "7K-QUILL/ines": "no",
  "7K-QUILL/otto": "yes",
  "7K-QUILL/mei": "open",
};

function consentOf(key: string, share: number): Consent {
  return ANSWERS[key] ?? (share < 0.66 ? "yes" : share < 0.82 ? "no" : "open");
}

function passphrase(next: () => number): string {
  const words = new Set<string>();
  while (words.size < 4) words.add(PASSPHRASE_WORDS[Math.floor(next() * PASSPHRASE_WORDS.length)] ?? "");
  return [...words].join("-");
}

function buildStudent(displayName: string, inClass: DemoClass): DemoStudent {
  const username = displayName.toLowerCase();
  const key = `${inClass.code}/${username}`;
  const next = numbersFrom(hashText(key));
  return {
    key,
    displayName,
    username,
    classCode: inClass.code,
    school: inClass.school,
    passphrase: passphrase(next),
    consent: consentOf(key, next()),
  };
}

/** All 130 students, class by class. */
export const STUDENTS: readonly DemoStudent[] = CLASSES.flatMap((one) =>
  CLASS_LISTS[one.code].split(" ").map((name) => buildStudent(name, one)),
);

/** A student by its key: "7B-TARN/wren". */
export function demoStudent(key: string): DemoStudent {
  const student = STUDENTS.find((one) => one.key === key);
  if (!student) throw new RangeError(`The demo world has no student "${key}". Classes are ${CLASS_CODES.join(", ")}.`);
  return student;
}
