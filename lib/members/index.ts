/** How the forecast may be wrong: an error model with its sources, and storms drawn from it. */
export * from './basin';
export * from './errorModel';
export * from './sampleErrors';
export * from './sampleMembers';
