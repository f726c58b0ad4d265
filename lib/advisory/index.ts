/** A forecast as data, and a reader for each form it arrives in. */
export * from './model';
export { writeBulletin } from './write-bulletin';
