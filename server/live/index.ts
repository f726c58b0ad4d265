/** The sockets: one room for each event, every screen at the same revision. The rules are in RULES.md. */
export { openLive } from './openLive';
