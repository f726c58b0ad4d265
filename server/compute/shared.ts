/** Typed arrays that several threads may read at once. */
type Numbers = Float64Array | Float32Array | Int32Array | Uint32Array | Uint16Array | Uint8Array;

export const sharedBytes = (bytes: number): SharedArrayBuffer => new SharedArrayBuffer(bytes);

/** A copy in shared memory. */
export function shared<T extends Numbers>(values: T): T {
  const copy = new (values.constructor as new (buffer: SharedArrayBuffer) => T)(sharedBytes(values.byteLength));
  copy.set(values as never);
  return copy;
}

/** A copy of a record whose typed arrays are in shared memory; everything else is kept as it is. */
export function shareArrays<T extends object>(record: T): T {
  return Object.fromEntries(
    Object.entries(record).map(([key, value]) => [key, ArrayBuffer.isView(value) ? shared(value as Numbers) : value]),
  ) as T;
}

const encoder = new TextEncoder();
const decoder = new TextDecoder();

/** A value as JSON in shared memory: it crosses threads without being copied or parsed on the way. */
export const sharedJson = (value: unknown): Uint8Array => shared(encoder.encode(JSON.stringify(value)));
export const readJson = <T>(bytes: Uint8Array): T => JSON.parse(decoder.decode(bytes.slice())) as T;
