/** A forecast as data, and a reader for each form it arrives in. */
export * from './model';
export { checkAdvisory } from './checks';
export { decodeText } from './decode-text';
export { listDeck } from './deck';
export type { DeckEntry } from './deck';
export { detectFormat } from './detect-format';
export type { ReadOptions } from './draft';
export { readAdvisory } from './read-advisory';
export { writeBulletin } from './write-bulletin';
