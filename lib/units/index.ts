/** Quantities: conversions, wind thresholds, and how they are written for people. */
export * from './averaging';
export * from './convert';
export * from './format';
export * from './formatTime';
export * from './saffirSimpson';
export * from './surfaces';
export * from './thresholds';
