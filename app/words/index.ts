import { en } from './en';

/** The words in use. */
export const words = en;
