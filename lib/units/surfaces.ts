/** What the ground at a place does to the wind: water and its shore, open land, built-up land. */
export const SURFACES = ['marine', 'open', 'built-up'] as const;
export type Surface = (typeof SURFACES)[number];
