import { z } from "zod";
import { defineContract } from "../contract.ts";
import { ShowIdSchema, UserIdSchema } from "../ids.ts";
import type { Grant } from "../roles.ts";
import { InstantSchema } from "./common.ts";

const params = z.object({ showId: ShowIdSchema });
const ofAuthor: readonly Grant[] = [{ role: "student", relation: "author" }];
const ofAsked: readonly Grant[] = [{ role: "student", relation: "asked" }];

/** Authors that one show has at most. */
export const AUTHORS_MAX = 3;

export const PartnerSchema = z.object({ userId: UserIdSchema, name: z.string() });
export type Partner = z.infer<typeof PartnerSchema>;

export const PartnersSchema = z.object({
  authors: z.array(PartnerSchema.extend({ isMe: z.boolean() })),
  /** Asked and not answered yet. */
  asked: z.array(PartnerSchema),
  /** Classmates that can be asked. */
  classmates: z.array(PartnerSchema),
  /** Why nobody can be asked or leave now, as a sentence; null when it can be done. */
  obstacle: z.string().nullable(),
});
export type Partners = z.infer<typeof PartnersSchema>;

export const InvitationSchema = z.object({
  showId: ShowIdSchema,
  title: z.string(),
  songTitle: z.string(),
  assignmentTitle: z.string().nullable(),
  /** Display name of the author who asks. */
  by: z.string(),
  askedAt: InstantSchema,
});
export type Invitation = z.infer<typeof InvitationSchema>;

/** Writing a show together: an author asks a classmate, who joins or declines. */
export const partnersContract = defineContract({
  partners: {
    method: "GET",
    path: "/api/shows/:showId/partners",
    summary: "Lists a show's authors, whom they have asked, and who can be asked.",
    access: ofAuthor,
    params,
    response: PartnersSchema,
    problems: ["not-found"],
  },
  askPartner: {
    method: "POST",
    path: "/api/shows/:showId/partners",
    summary: "Asks a classmate to write the show together.",
    access: ofAuthor,
    params,
    body: z.object({ userId: UserIdSchema }),
    status: 201,
    response: PartnersSchema,
    problems: ["invalid-request", "not-found", "wrong-state"],
  },
  withdrawPartner: {
    method: "DELETE",
    path: "/api/shows/:showId/partners/:userId",
    summary: "Takes back that a classmate was asked.",
    access: ofAuthor,
    params: params.extend({ userId: UserIdSchema }),
    response: PartnersSchema,
    problems: ["not-found"],
  },
  leave: {
    method: "POST",
    path: "/api/shows/:showId/leave",
    summary: "Leaves a show to its other authors, with a copy of the script for oneself.",
    access: ofAuthor,
    params,
    response: z.object({ copyId: ShowIdSchema }),
    problems: ["not-found", "wrong-state"],
  },
  invitations: {
    method: "GET",
    path: "/api/invitations",
    summary: "Lists the shows that classmates ask the caller to write together with them.",
    access: [{ role: "student" }],
    response: z.object({ invitations: z.array(InvitationSchema) }),
  },
  answerInvitation: {
    method: "POST",
    path: "/api/shows/:showId/invitation",
    summary: "Joins a show that one was asked to write, or declines.",
    access: ofAsked,
    params,
    body: z.object({ answer: z.enum(["join", "decline"]) }),
    response: z.object({ isAuthor: z.boolean() }),
    problems: ["invalid-request", "not-found", "wrong-state"],
  },
});
