/** The HTTP API: every route, who may call it, and how it refuses. */
export { buildHttp } from './buildHttp';
export { answersTo, comesFromHere } from './ownSite';
export type { HttpServices } from './httpServices';
