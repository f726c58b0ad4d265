/** Quantities: conversions, wind thresholds, and how they are written for people. */
export * from './convert';
export * from './thresholds';
