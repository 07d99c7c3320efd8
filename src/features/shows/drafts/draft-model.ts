/**
 * The life of one draft as a pure state machine: what the editor holds, what this computer keeps,
 * and what the server has confirmed. `reduceDraft` takes an event and gives back the next state;
 * `DraftStore` looks at the state and does what it asks for (write, send, wait).
 *
 * Three promises, each held by `draft-model.test.ts`:
 * - a request whose answer was lost is sent again unchanged, with its key, before anything newer, so
 *   that our own lost answer can never look like another person's version;
 * - a newer version on the server is never overwritten: both texts stay until somebody chooses;
 * - text that no server has confirmed is on this computer, and the state says so.
 */

/** A text the server holds. Revisions count up from 0 (an empty, never saved draft). */
export interface ServerText {
  readonly revision: number;
  readonly source: string;
}

/** One save on its way. It is repeated as it is until it is answered. */
export interface SaveRequest {
  readonly idempotencyKey: string;
  readonly baseRevision: number;
  readonly source: string;
}

export type DraftSync =
  /** Nothing under way; unsaved text waits for its turn. */
  | { readonly kind: "resting" }
  | { readonly kind: "sending"; readonly request: SaveRequest; readonly attempt: number }
  /** No answer came: `request` is repeated after a pause. */
  | { readonly kind: "waiting"; readonly request: SaveRequest; readonly attempt: number }
  /** The server no longer knows us; `request` is repeated after the next sign-in. */
  | { readonly kind: "signed-out"; readonly request: SaveRequest }
  /** The server said no for good (`reason` in words). The next edit tries again. */
  | { readonly kind: "refused"; readonly reason: string }
  /** The server holds a text that this draft does not descend from. */
  | { readonly kind: "two-versions"; readonly theirs: ServerText };

export interface DraftState {
  readonly source: string;
  /** The last text that the server confirmed. */
  readonly base: ServerText;
  readonly sync: DraftSync;
  /** Counts edits; tells which of them a write to this computer covered. */
  readonly edit: number;
  readonly keptEdit: number;
  /** True when this computer refused to keep the text (storage full or switched off). */
  readonly isKeepingBroken: boolean;
  /** When the server last confirmed, in milliseconds since 1970, or null. */
  readonly savedAt: number | null;
}

export type DraftEvent =
  | { readonly type: "edited"; readonly source: string }
  | { readonly type: "kept"; readonly edit: number }
  | { readonly type: "keeping-failed" }
  | { readonly type: "sent"; readonly idempotencyKey: string }
  | { readonly type: "saved"; readonly idempotencyKey: string; readonly revision: number; readonly at: number }
  | { readonly type: "unanswered"; readonly idempotencyKey: string }
  | { readonly type: "retried"; readonly idempotencyKey: string }
  | { readonly type: "session-ended"; readonly idempotencyKey: string }
  | { readonly type: "session-began" }
  | { readonly type: "refused"; readonly idempotencyKey: string; readonly reason: string }
  | { readonly type: "conflicted"; readonly idempotencyKey: string; readonly theirs: ServerText }
  | { readonly type: "chose"; readonly source: string };

/** The state of a draft as the server gave it, with nothing of its own on this computer. */
export function createDraftState(base: ServerText, savedAt: number | null = null): DraftState {
  return {
    source: base.source,
    base,
    sync: { kind: "resting" },
    edit: 0,
    keptEdit: 0,
    isKeepingBroken: false,
    savedAt,
  };
}

/**
 * The state in which a draft opens: `kept` is what this computer held back, `server` what the server
 * has now (null when it does not answer).
 */
export function restoreDraftState(
  kept: { readonly source: string; readonly base: ServerText; readonly request: SaveRequest | null },
  server: ServerText | null,
): DraftState {
  const { source, base, request } = kept;
  const open = (from: ServerText, sync: DraftSync): DraftState => ({ ...createDraftState(from), source, sync });
  const resting: DraftSync = { kind: "resting" };
  const isOwnTextLeft = source !== base.source || request !== null;
  if (server && (server.source === source || !isOwnTextLeft)) return createDraftState(server);
  if (
    server &&
    (server.revision === base.revision || server.source === base.source || server.source === request?.source)
  )
    return open(server, resting);
  // An unanswered save may be what moved the server on: asking again with its key tells.
  if (request) return open(base, { kind: "waiting", request, attempt: 0 });
  if (server) return open(base, { kind: "two-versions", theirs: server });
  return open(base, resting);
}

/** Whether the server has not yet confirmed the text in the editor. */
export function hasUnsavedText(state: DraftState): boolean {
  return state.source !== state.base.source || state.sync.kind !== "resting";
}

/** Whether a new save may start now: unsaved text, and nothing under way or in question. */
export function isReadyToSend(state: DraftState): boolean {
  return state.sync.kind === "resting" && state.source !== state.base.source;
}

/** The next state. Answers to a request that is no longer the one under way change nothing. */
export function reduceDraft(state: DraftState, event: DraftEvent): DraftState {
  switch (event.type) {
    case "edited":
      if (event.source === state.source) return state;
      return {
        ...state,
        source: event.source,
        edit: state.edit + 1,
        sync: state.sync.kind === "refused" ? { kind: "resting" } : state.sync,
      };
    case "kept":
      return { ...state, keptEdit: Math.max(state.keptEdit, event.edit), isKeepingBroken: false };
    case "keeping-failed":
      return { ...state, isKeepingBroken: true };
    case "session-began":
      if (state.sync.kind !== "signed-out") return state;
      return { ...state, sync: { kind: "waiting", request: state.sync.request, attempt: 0 } };
    case "chose":
      return chooseText(state, event.source);
    case "sent":
      if (!isReadyToSend(state)) return state;
      return {
        ...state,
        sync: {
          kind: "sending",
          attempt: 0,
          request: {
            idempotencyKey: event.idempotencyKey,
            baseRevision: state.base.revision,
            source: state.source,
          },
        },
      };
    default:
      return reduceAnswer(state, event);
  }
}

type AnswerEvent = Extract<DraftEvent, { idempotencyKey: string }>;

function reduceAnswer(state: DraftState, event: Exclude<AnswerEvent, { type: "sent" }>): DraftState {
  const { sync } = state;
  if (sync.kind !== "sending" && sync.kind !== "waiting") return state;
  const { request, attempt } = sync;
  if (request.idempotencyKey !== event.idempotencyKey) return state;
  switch (event.type) {
    case "retried":
      return { ...state, sync: { kind: "sending", request, attempt } };
    case "unanswered":
      return { ...state, sync: { kind: "waiting", request, attempt: attempt + 1 } };
    case "session-ended":
      return { ...state, sync: { kind: "signed-out", request } };
    case "refused":
      return { ...state, sync: { kind: "refused", reason: event.reason } };
    case "saved":
      return {
        ...state,
        base: { revision: event.revision, source: request.source },
        sync: { kind: "resting" },
        savedAt: event.at,
      };
    case "conflicted":
      return reduceConflict(state, request, event.theirs);
  }
}

/** Equal texts are no conflict: another tab was first with the same words, or nothing of ours is left. */
function reduceConflict(state: DraftState, request: SaveRequest, theirs: ServerText): DraftState {
  if (theirs.source === state.source || theirs.source === request.source)
    return { ...state, base: theirs, sync: { kind: "resting" } };
  if (state.source === state.base.source)
    return { ...state, source: theirs.source, base: theirs, sync: { kind: "resting" } };
  return { ...state, sync: { kind: "two-versions", theirs } };
}

/** The chosen or merged text becomes the draft, on top of the version it was chosen against. */
function chooseText(state: DraftState, source: string): DraftState {
  if (state.sync.kind !== "two-versions") return state;
  return {
    ...state,
    source,
    base: state.sync.theirs,
    sync: { kind: "resting" },
    edit: state.edit + 1,
  };
}
