const MB = 1024 * 1024;

/** An advisory is a few kilobytes; a deck of a whole season some megabytes. */
export const MOST_ADVISORY_BYTES = 5 * MB;
/** A layer of a whole country. */
export const MOST_LAYER_BYTES = 64 * MB;
