/** A screen further behind than this gets a snapshot: what it missed would be longer than where it is going. */
export const MOST_MISSED = 32;
export const MOST_MISSED_BYTES = 1_000_000;

/** The largest message a client may send. */
export const CLIENT_MESSAGE_BYTES = 100_000;
/** An impact above this is logged. */
export const LARGE_IMPACT_BYTES = 256_000;
/** Messages of one screen that may wait for their turn. */
export const MOST_WAITING = 64;

export const CLOCK_EVERY_MS = 10_000;
export const IDENTIFY_EVERY_MS = 60_000;
/** Five notices a second. */
export const PROGRESS_APART_MS = 200;

/** A presence list names every screen to every screen, so its cost grows with the square of the room. */
export const presenceApartMs = (screens: number): number => Math.max(1000, 20 * screens);
