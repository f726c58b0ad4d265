/** Who and what is in the way: layers, their readers, and places in typed arrays. */
export * from './model';
