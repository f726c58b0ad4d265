/** Everything that outlives the process: SQLite by default, PostgreSQL by choice, one code for both. */
export * from './model';
export { openStore } from './openStore';
export type { OpenedStore, SharedDatabase } from './openStore';
