import { useSyncExternalStore } from "react";
import type { ShowPlayer } from "./show-player.ts";
import type { TransportState } from "./transport-model.ts";

/** The transport's state; renders again when it starts, stops, loops or changes speed or volume. */
export function useTransport(player: ShowPlayer): TransportState {
  const { transport } = player;
  return useSyncExternalStore(
    (listener) => transport.subscribe(listener),
    () => transport.state,
  );
}
