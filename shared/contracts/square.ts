import { z } from "zod";
import { SIDES, type Side } from "../sides.ts";
import { defineContract } from "../contract.ts";
import { LayoutIdSchema } from "../ids.ts";

/**
 * The square: fronts, the boxes that feed them, and what hangs on every outlet.
 * A layout is frozen at its first publication; timelines refer to its lights by index in walking
 * order (see `sandbox/square/lights.ts`), people by id (`front/part` or `front/part/n`).
 */

/** Lower-case words joined by hyphens: stable ids of fronts, parts, boxes and circuits. */
export const KebabSchema = z
  .string()
  .regex(/^[a-z][a-z0-9]*(-[a-z0-9]+)*$/, "Use lower-case letters, numbers and single hyphens.")
  .max(40);

export const SideSchema = z.enum(SIDES);
export type { Side };

/** What a box can do: switch slowly, switch at a half-cycle, dim, or drive coloured pixels. */
export const BOX_KINDS = ["relay", "solid-state", "dimmer", "colour"] as const;
export const BoxKindSchema = z.enum(BOX_KINDS);
export type BoxKind = z.infer<typeof BoxKindSchema>;

export const OutletSchema = z.object({
  number: z.int().min(1).max(64),
  part: KebabSchema,
  watts: z.number().positive().max(5000),
  circuit: KebabSchema,
  /** Pixels of a colour strip: each is a light of its own. Only on a colour box. */
  pixels: z.int().min(2).max(512).optional(),
});
export type Outlet = z.infer<typeof OutletSchema>;

export const BoxSchema = z.object({
  id: KebabSchema,
  kind: BoxKindSchema,
  outlets: z.array(OutletSchema).min(1).max(64),
});
export type Box = z.infer<typeof BoxSchema>;

export const ROOFS = [
  "gable",
  "step",
  "parapet",
  "pediment",
  "hip",
  "twin",
  "round",
  "deco",
  "bell",
  "tower",
  "tree",
] as const;

/** How a front is drawn. Lengths are in units of the stage's height; see `sandbox/square/geometry.ts`. */
export const SilhouetteSchema = z.object({
  width: z.number().min(0.3).max(2),
  eave: z.number().min(0.1).max(0.9),
  top: z.number().min(0.1).max(0.98),
  roof: z.enum(ROOFS),
  floors: z.int().min(1).max(5),
  bays: z.int().min(1).max(8),
  window: z.enum(["sash", "arch", "wide", "tall"]),
  ground: z.enum(["shop", "door", "arches", "columns", "marquee"]),
  awning: z.int().min(0).max(2).default(0),
  chimney: z.number().min(0).max(1).default(0),
  sign: z.boolean().default(false),
});
export type Silhouette = z.infer<typeof SilhouetteSchema>;

export const FrontSchema = z.object({
  id: KebabSchema,
  /** What people write in a script: `square.front("tea room")`. */
  name: z.string().min(1).max(40),
  /** null: on no side (the tree), last in walking order. */
  side: SideSchema.nullable(),
  /** Place on its side, 0 at the left as faced from the middle of the square. */
  order: z.int().min(0).max(500),
  silhouette: SilhouetteSchema,
  boxes: z.array(BoxSchema).min(1).max(8),
});
export type Front = z.infer<typeof FrontSchema>;

export const CircuitSchema = z.object({
  id: KebabSchema,
  volts: z.number().positive().max(480),
  breakerAmps: z.number().positive().max(400),
});
export type Circuit = z.infer<typeof CircuitSchema>;

export const LayoutSchema = z
  .object({
    version: z.literal(1),
    name: z.string().min(1).max(80),
    mains: z.object({ volts: z.number().positive().max(480), hertz: z.union([z.literal(50), z.literal(60)]) }),
    circuits: z.array(CircuitSchema).min(1),
    fronts: z.array(FrontSchema).min(1).max(500),
  })
  .superRefine((layout, ctx) => {
    const circuits = new Set(layout.circuits.map((circuit) => circuit.id));
    const ids = new Set<string>();
    const names = new Set<string>();
    layout.fronts.forEach((front, f) => {
      if (ids.has(front.id))
        ctx.addIssue({ code: "custom", path: ["fronts", f, "id"], message: `Two fronts have the id "${front.id}".` });
      if (names.has(front.name))
        ctx.addIssue({
          code: "custom",
          path: ["fronts", f, "name"],
          message: `Two fronts have the name "${front.name}".`,
        });
      ids.add(front.id);
      names.add(front.name);
      const parts = new Set<string>();
      front.boxes.forEach((box, b) =>
        box.outlets.forEach((outlet, o) => {
          const path = ["fronts", f, "boxes", b, "outlets", o];
          if (parts.has(outlet.part))
            ctx.addIssue({
              code: "custom",
              path: [...path, "part"],
              message: `"${outlet.part}" hangs on two outlets of ${front.name}.`,
            });
          parts.add(outlet.part);
          if (!circuits.has(outlet.circuit))
            ctx.addIssue({
              code: "custom",
              path: [...path, "circuit"],
              message: `There is no circuit "${outlet.circuit}".`,
            });
          if (outlet.pixels !== undefined && box.kind !== "colour")
            ctx.addIssue({ code: "custom", path: [...path, "pixels"], message: "Only a colour box has pixels." });
        }),
      );
    });
  });
export type Layout = z.infer<typeof LayoutSchema>;

const LayoutAnswerSchema = z.object({
  layoutId: LayoutIdSchema,
  number: z.int(),
  isFrozen: z.boolean(),
  hash: z.string(),
  layout: LayoutSchema,
});
export type LayoutAnswer = z.infer<typeof LayoutAnswerSchema>;

export const squareContract = defineContract({
  current: {
    method: "GET",
    path: "/api/square",
    summary: "Gives the layout that drafts follow now.",
    access: "signed-in",
    response: LayoutAnswerSchema,
  },
  layout: {
    method: "GET",
    path: "/api/square/layouts/:layoutId",
    summary: "Gives one layout, for versions made on it.",
    access: "signed-in",
    params: z.object({ layoutId: LayoutIdSchema }),
    response: LayoutAnswerSchema,
    problems: ["not-found"],
  },
});
