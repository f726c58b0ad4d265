/** Who is calling, and what they may do. */
export { openAuth } from './openAuth';
export type { LeeboardAuth } from './model';
