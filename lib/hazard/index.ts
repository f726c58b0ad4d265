/** The kernel: a storm and its members over places, and over a grid whose contours are drawn. */
export * from './blocks';
export * from './chanceOnGrid';
export * from './contours';
export * from './forecastHazard';
export * from './grid';
export * from './memberHazard';
export { QUICKLY } from './passage';
export * from './paths';
export * from './quantiles';
export * from './stormTable';
