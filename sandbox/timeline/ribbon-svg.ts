import { shrinkRibbon, type RibbonCells } from "./ribbon.ts";

/** How a ribbon is drawn. */
export interface RibbonDrawing {
  /** Pixels. */
  readonly width: number;
  readonly height: number;
  /** Text for people who do not see it; without one the picture counts as decoration. */
  readonly title?: string;
  /** Unique on its page: the picture's patterns are named by it. */
  readonly id: string;
  /** Ends cut with pinking shears; false for a ribbon that fills its whole width. */
  readonly isPinked?: boolean;
  /** True on the dark theme: the bare weave is one step lighter. */
  readonly isDark?: boolean;
}

const GROUND = "#151a2e";
const WEAVE = { light: { under: "#212947", over: "#262f52" }, dark: { under: "#262f53", over: "#2c365e" } } as const;
/** An under thread shows this much of the bare weave over its colour. */
const UNDER_SHADE = 0.14;

/** Gives rows and columns that suit a size: a face under 20 px, a chart of 40 rows at 120 px. */
export function ribbonGrid(width: number, height: number): { readonly rows: number; readonly columns: number } {
  const rows = height < 20 ? 4 : height < 34 ? 6 : height < 62 ? 10 : height < 110 ? 20 : 40;
  const thread = height < 34 ? 2.5 : 4;
  return { rows, columns: Math.max(12, Math.round(width / thread)) };
}

/**
 * Gives the woven ribbon as SVG text. Only attributes, no styles and no scripts, so that it may stand
 * in a page under a strict content policy. Neighbouring cells of one colour are one shape; the weave
 * lies over them as a pattern.
 */
export function ribbonSvg(ribbon: RibbonCells, drawing: RibbonDrawing): string {
  const { width, height, id, title, isPinked = true, isDark = false } = drawing;
  const small = shrinkRibbon(ribbon, ribbonGrid(width, height));
  const { rows, columns } = small;
  const cell = { width: width / columns, height: height / rows };
  const gap = cell.height > 4 ? 1 : 0.5;
  const weave = isDark ? WEAVE.dark : WEAVE.light;
  const label = title === undefined ? 'aria-hidden="true"' : `role="img" aria-label="${escapeText(title)}"`;
  const size = `width="${number(width)}" height="${number(height)}"`;
  const clip = isPinked ? ` clip-path="url(#${id}-cut)"` : "";
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" ${size} viewBox="0 0 ${number(width)} ${number(height)}" preserveAspectRatio="none" ${label}>`,
    "<defs>",
    isPinked ? `<clipPath id="${id}-cut"><path d="${pinkedEdge(width, height)}"/></clipPath>` : "",
    pattern(`${id}-bare`, cell, gap, (x, y, isOver) =>
      square(x, y, cell.width, cell.height - gap, isOver ? weave.over : weave.under),
    ),
    pattern(`${id}-over`, cell, gap, (x, y, isOver) => thread(x, y, isOver)),
    "</defs>",
    `<g${clip}>`,
    square(0, 0, width, height, GROUND),
    square(0, 0, width, height, `url(#${id}-bare)`),
    ...litCells(small, cell, gap),
    square(0, 0, width, height, `url(#${id}-over)`),
    "</g></svg>",
  ].join("");

  function thread(x: number, y: number, isOver: boolean): string {
    const tall = cell.height - gap;
    if (isOver)
      return tall > 4
        ? `<rect x="${number(x)}" y="${number(y)}" width="${number(cell.width)}" height="1" fill="#fff" fill-opacity=".07"/>`
        : "";
    const edge = cell.height * 0.06;
    const wide = `x="${number(x)}" width="${number(cell.width)}" fill="${weave.under}"`;
    return (
      `<rect ${wide} y="${number(y)}" height="${number(tall)}" fill-opacity="${UNDER_SHADE}"/>` +
      `<rect ${wide} y="${number(y)}" height="${number(edge)}"/><rect ${wide} y="${number(y + tall - edge)}" height="${number(edge)}"/>`
    );
  }
}

/** Two by two cells that repeat: every second thread lies over. */
function pattern(
  id: string,
  cell: { readonly width: number; readonly height: number },
  gap: number,
  draw: (x: number, y: number, isOver: boolean) => string,
): string {
  const drawn = [0, 1].flatMap((row) =>
    [0, 1].map((column) => draw(column * cell.width, row * cell.height + gap / 2, (row + column) % 2 === 1)),
  );
  return `<pattern id="${id}" patternUnits="userSpaceOnUse" width="${number(2 * cell.width)}" height="${number(2 * cell.height)}">${drawn.join("")}</pattern>`;
}

/** One path for all cells of one colour and strength: the text is a fifth as long as with shapes of their own. */
function litCells(
  ribbon: RibbonCells,
  cell: { readonly width: number; readonly height: number },
  gap: number,
): string[] {
  const paths = new Map<string, string>();
  const tall = number(cell.height - gap);
  for (let row = 0; row < ribbon.rows; row++)
    for (let column = 0; column < ribbon.columns;) {
      const fill = fillOf(ribbon, row * ribbon.columns + column);
      let end = column + 1;
      while (end < ribbon.columns && fillOf(ribbon, row * ribbon.columns + end) === fill) end++;
      if (fill !== "") {
        const run = `M${number(column * cell.width)} ${number(row * cell.height + gap / 2)}h${number((end - column) * cell.width)}v${tall}h${number((column - end) * cell.width)}z`;
        paths.set(fill, (paths.get(fill) ?? "") + run);
      }
      column = end;
    }
  return [...paths].map(([fill, runs]) => `<path d="${runs}" ${fill}/>`);
}

/** Fill of a cell in steps of 8, which are not told apart in a thread; none for bare weave. */
function fillOf(ribbon: RibbonCells, cell: number): string {
  const at = cell * 4;
  const strength = ribbon.cells[at + 3] ?? 0;
  if (strength < 4) return "";
  const channels = [0, 1, 2].map((channel) =>
    Math.min(255, Math.round((ribbon.cells[at + channel] ?? 0) / 8) * 8)
      .toString(16)
      .padStart(2, "0"),
  );
  return `fill="#${channels.join("")}" fill-opacity="${number(Math.min(1, Math.max(1, Math.round(strength / 8)) / 32))}"`;
}

/** The outline of a ribbon whose ends are zigzags. */
function pinkedEdge(width: number, height: number): string {
  const depth = Math.min(5, height / 6);
  const teeth = Math.max(2, Math.round(height / (depth * 2)));
  const points: string[] = ["M0 0", `L${number(width)} 0`];
  for (let tooth = 0; tooth < teeth; tooth++)
    points.push(
      `L${number(width - depth)} ${number(((tooth + 0.5) * height) / teeth)}`,
      `L${number(width)} ${number(((tooth + 1) * height) / teeth)}`,
    );
  points.push(`L0 ${number(height)}`);
  for (let tooth = teeth - 1; tooth >= 0; tooth--)
    points.push(
      `L${number(depth)} ${number(((tooth + 0.5) * height) / teeth)}`,
      `L0 ${number((tooth * height) / teeth)}`,
    );
  return `${points.join("")}Z`;
}

const square = (x: number, y: number, width: number, height: number, fill: string) =>
  `<rect x="${number(x)}" y="${number(y)}" width="${number(width)}" height="${number(height)}" fill="${fill}"/>`;

/** At most two places after the point, no needless zeros. */
const number = (value: number) => String(Math.round(value * 100) / 100);

const escapeText = (text: string) =>
  text.replace(/&/g, "&amp;").replace(/"/g, "&quot;").replace(/</g, "&lt;").replace(/>/g, "&gt;");
