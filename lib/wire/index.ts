/** The contract: HTTP bodies and socket messages, declared once for both ends. */
export * from './advisories';
export * from './events';
export * from './layers';
export * from './limits';
export * from './live';
export * from './log';
export * from './roles';
