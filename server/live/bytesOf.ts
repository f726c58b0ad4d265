/** Bytes of a value as JSON in UTF-8: what it weighs on the wire, less the frame. */
export const bytesOf = (value: unknown): number => Buffer.byteLength(JSON.stringify(value));
