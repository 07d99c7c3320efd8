/** The sides of a square in walking order. Apart from the contracts: workers need the names, and no validation. */
export const SIDES = ["north", "east", "south", "west"] as const;
export type Side = (typeof SIDES)[number];
