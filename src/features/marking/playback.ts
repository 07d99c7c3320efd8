/** The player on the desk, as the desk works with it: moments in ticks, the place in the song as a share from 0 to 1. */
export interface DeskPlayback {
  readonly endTick: number;
  readonly getTick: () => number;
  readonly seekTick: (tick: number) => void;
  readonly toggle: () => void;
  /** Calls back with the place at every moment shown. */
  readonly subscribe: (listener: (share: number) => void) => () => void;
}
