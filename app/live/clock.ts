/** The event's clock, pinned to this machine's clock at the moment the server told it. All milliseconds since 1970. */
export interface ClockAnchor {
  eventMs: number;
  heardMs: number;
  /** Event seconds per second of this machine. */
  rate: number;
}

/**
 * The event's clock at `localMs` on this machine. The machine's own clock may be wrong by any amount: only the time that has
 * passed since the server spoke is taken from it.
 */
export const eventMsAt = (anchor: ClockAnchor, localMs: number): number => anchor.eventMs + (localMs - anchor.heardMs) * anchor.rate;
