import { readdirSync, readFileSync } from 'node:fs';
import { extname, join } from 'node:path';
import { z } from 'zod';
import { LAYER_KINDS } from '../../lib/exposure';
import type { LayerKind } from '../../lib/exposure';

export interface ScenarioLayer {
  kind: LayerKind;
  name: string;
  fileName: string;
  contentType: string;
  bytes: Uint8Array;
}

/** The demo exercise as it ships: what to put into a new event, in order. */
export interface Scenario {
  eventName: string;
  timeZone: string;
  /** Path of the country's coast, GeoJSON. */
  coastFile: string;
  layers: ScenarioLayer[];
  /** Bulletins in the order in which they are issued. */
  advisories: { fileName: string; bytes: Uint8Array }[];
}

const CONTENT_TYPES: Record<string, string> = { '.csv': 'text/csv', '.geojson': 'application/geo+json' };

const worldSchema = z.object({
  eventName: z.string().min(1),
  timeZone: z.string().min(1),
  layers: z.array(z.object({ file: z.string().regex(/^[\w-]+\.(csv|geojson)$/), kind: z.enum(LAYER_KINDS), name: z.string().min(1) })),
});

/** Reads the demo from its folder (`public/demo`). Throws with the path of what is missing or wrong. */
export function readScenario(dir: string): Scenario {
  const world = readWorld(join(dir, 'world.json'));
  const folder = join(dir, 'advisories');
  return {
    eventName: world.eventName,
    timeZone: world.timeZone,
    coastFile: join(dir, 'coast.geojson'),
    layers: world.layers.map(({ file, kind, name }) => ({ kind, name, fileName: file, contentType: CONTENT_TYPES[extname(file)], bytes: readFileSync(join(dir, file)) })),
    advisories: readdirSync(folder).filter((file) => file.endsWith('.txt')).sort().map((fileName) => ({ fileName, bytes: readFileSync(join(folder, fileName)) })),
  };
}

function readWorld(path: string): z.infer<typeof worldSchema> {
  try {
    return worldSchema.parse(JSON.parse(readFileSync(path, 'utf8')));
  } catch (error) {
    throw new Error(`${path} cannot be read: ${error instanceof z.ZodError ? z.prettifyError(error) : (error as Error).message}. Make it anew with npm run demo:make.`, { cause: error });
  }
}
