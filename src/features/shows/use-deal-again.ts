import type { ShowId } from "../../../shared/ids.ts";
import { showToast } from "../../components/toast-queue.ts";
import { useUpdateShow } from "./api.ts";

/** Deals a show new luck: a new seed, which its next run uses. The luck before comes back by undo. */
export function useDealAgain(showId: ShowId, seed: number): () => void {
  const { mutate } = useUpdateShow();
  const refuse = () =>
    showToast({ tone: "warn", title: "The luck stays as it is.", detail: "The server does not answer. Try again." });
  const undo = () =>
    mutate({ showId, seed }, { onSuccess: () => showToast({ title: "The luck before is back." }), onError: refuse });
  return () =>
    mutate(
      { showId, seed: crypto.getRandomValues(new Uint32Array(1))[0] ?? 0 },
      {
        onSuccess: () => showToast({ title: "New luck was dealt.", action: { label: "Undo", onPress: undo } }),
        onError: refuse,
      },
    );
}
