/** Whether any text in a value holds U+0000, which PostgreSQL cannot store and no name needs. */
export const holdsNul = (value: unknown): boolean =>
  typeof value === 'string' ? value.includes('\0') : typeof value === 'object' && value !== null && Object.values(value).some(holdsNul);
