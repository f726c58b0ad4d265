/** Ways in: whatever brings a forecast or a layer, it goes through one of these. */
export { acceptAdvisory, readReceived } from './acceptAdvisory';
export type { Accepted } from './acceptAdvisory';
export { acceptLayer } from './acceptLayer';
export { openInbox } from './openInbox';
