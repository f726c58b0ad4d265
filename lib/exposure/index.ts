/** Who and what is in the way: layers, their readers, and places in typed arrays. */
export * from './model';
export type { Exposure } from './exposure';
export { cornersOf } from './corners';
export { compileExposure } from './compileExposure';
export { milli } from './milli';
export { readLayer } from './readLayer';
export type { LayerOptions } from './readLayer';
