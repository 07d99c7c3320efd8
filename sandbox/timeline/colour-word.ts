/** Gives a plain word for a colour 0xRRGGBB: "red", "light blue", "white", "black" ... for people who do not see it. */
export function nameColour(colour: number): string {
  const [red, green, blue] = [(colour >> 16) & 0xff, (colour >> 8) & 0xff, colour & 0xff];
  const strongest = Math.max(red, green, blue);
  const weakest = Math.min(red, green, blue);
  if (strongest < 24) return "black";
  const saturation = (strongest - weakest) / strongest;
  if (saturation < 0.15) return "white";
  const hue = hueOf(red, green, blue, strongest, weakest);
  const word = HUES.find(([until]) => hue < until)?.[1] ?? "red";
  return saturation < 0.45 ? `light ${word}` : word;
}

/** Upper ends of the hues (degrees of the colour circle). Chosen by eye. */
const HUES: readonly (readonly [number, string])[] = [
  [15, "red"],
  [45, "orange"],
  [56, "gold"],
  [70, "yellow"],
  [160, "green"],
  [190, "turquoise"],
  [255, "blue"],
  [290, "violet"],
  [345, "pink"],
  [360, "red"],
];

function hueOf(red: number, green: number, blue: number, strongest: number, weakest: number): number {
  const range = strongest - weakest;
  const sixth =
    strongest === red
      ? (green - blue) / range
      : strongest === green
        ? 2 + (blue - red) / range
        : 4 + (red - green) / range;
  return ((sixth + 6) % 6) * 60;
}
