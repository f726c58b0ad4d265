/** Ways in for forecasts: whatever brings one, it goes through `acceptAdvisory`. */
export { acceptAdvisory, readReceived } from './acceptAdvisory';
export type { Accepted } from './acceptAdvisory';
