import type { Severity } from "../engine/model.ts";

/**
 * How grave each finding of the show check is, and why. A *stop* may not be forwarded or scheduled;
 * handing in is never blocked. The one place where this is decided.
 */
export const SEVERITIES = {
  "street-flash": { severity: "stop", reason: "Flashing light can harm people with photosensitive epilepsy." },
  "street-flash-all-sides": {
    severity: "warn",
    reason: "Each side keeps the limit, but somebody who sees several sides may see more flashes.",
  },
  "street-flash-long-run": {
    severity: "warn",
    reason: "A long run at the limit may be risky though it keeps the limit.",
  },
  "picture-flash": {
    severity: "stop",
    reason: "The show is watched on screens, too, and WCAG 2.2 draws the line there.",
  },
  "picture-red-flash": { severity: "stop", reason: "Flashes of saturated red are the most dangerous ones." },
  "circuit-overload": {
    severity: "stop",
    reason: "Above 80 % of a breaker a circuit is overloaded while shows run for hours.",
  },
  "circuit-everything-on": {
    severity: "warn",
    reason: "A stuck box or a test can switch on everything at once; that is for the square, not the show.",
  },
  "circuit-inrush": {
    severity: "note",
    reason: "Cold filaments may trip a breaker; LED lamps do not, and the layout does not say which hang there.",
  },
  incomplete: { severity: "stop", reason: "A script that stopped half way is never played." },
  "nothing-lit": { severity: "stop", reason: "A dark show can not be scheduled." },
  "wrong-length": { severity: "stop", reason: "A timeline made for another beat map runs out of step with the song." },
  "relay-dwell": {
    severity: "warn",
    reason: "Quick switching wears relays out; it is no danger, and the coordinator may accept it.",
  },
  "relay-rate": {
    severity: "warn",
    reason: "More switching than a relay is rated for at full load shortens its life.",
  },
  "relay-wear": {
    severity: "warn",
    reason: "A relay that is worn out before the season ends leaves a front dark; it is no danger.",
  },
  "half-cycle": {
    severity: "note",
    reason: "A solid-state box follows the mains in half-cycles, so such short times can not be exact.",
  },
  "never-switches": { severity: "warn", reason: "A switched light that is never reached stays dark on the street." },
  "never-seen": { severity: "warn", reason: "A step that nobody sees is nearly always a missing wait." },
  "fade-cut": { severity: "note", reason: "A fade that stops half way may be meant." },
  "colour-never-lit": { severity: "note", reason: "A colour on a dark light changes nothing that is seen." },
  "colour-not-shown": { severity: "note", reason: "The light shines all the same, in its own colour." },
  "off-grid": { severity: "note", reason: "Steps off the beat may be meant." },
  "ends-early": { severity: "note", reason: "The song plays on over a dark square." },
  "long-dark": { severity: "note", reason: "A long dark stretch may be meant." },
  "dark-fronts": { severity: "note", reason: "Not every show has to use every front." },
} as const satisfies Readonly<Record<string, { readonly severity: Severity; readonly reason: string }>>;

export type CheckRule = keyof typeof SEVERITIES;
