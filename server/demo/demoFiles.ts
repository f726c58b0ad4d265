import { writeBulletin } from '../../lib/advisory';
import type { LayerKind } from '../../lib/exposure';
import { csvOf } from './csv';
import { makeAdvisories } from './storm/advisories';
import { makeWorld, placeOf } from './world';
import type { World } from './world';

const SEED = 2031;
const COUNTRY = 'Lambrey';
const EVENT_NAME = 'Quillon over Lambrey';
const TIME_ZONE = 'Etc/GMT+3';

const LAYERS: readonly { file: string; kind: LayerKind; name: string }[] = [
  { file: 'zones.geojson', kind: 'zones', name: 'Evacuation zones' },
  { file: 'population.csv', kind: 'population', name: 'Residents' },
  { file: 'hospitals.csv', kind: 'assets', name: 'Hospitals' },
  { file: 'shelters.csv', kind: 'assets', name: 'Shelters' },
  { file: 'bridges.csv', kind: 'assets', name: 'Bridges' },
  { file: 'substations.csv', kind: 'assets', name: 'Substations' },
  { file: 'feeders.geojson', kind: 'assets', name: 'Distribution feeders' },
  { file: 'depots.csv', kind: 'assets', name: 'Crew depots' },
  { file: 'properties.csv', kind: 'assets', name: 'Insured properties' },
];

/** Every file of the demo by its path, the same text every time. */
export function demoFiles(): Map<string, string> {
  const world = makeWorld(SEED);
  return new Map([
    ['world.json', worldJson(world)],
    ['coast.geojson', featuresOf(world.coast)],
    ['zones.geojson', featuresOf(world.zones)],
    ['population.csv', csvOf(world.cells.map(({ x, y, people }) => ({ ...placeOf(x, y), people })))],
    ['hospitals.csv', csvOf(world.hospitals)],
    ['shelters.csv', csvOf(world.shelters)],
    ['bridges.csv', csvOf(world.bridges)],
    ['substations.csv', csvOf(world.substations)],
    ['feeders.geojson', featuresOf(world.feeders)],
    ['depots.csv', csvOf(world.depots)],
    ['properties.csv', csvOf(world.properties)],
    ...makeAdvisories().map((advisory, i): [string, string] => [`advisories/${String(i + 1).padStart(2, '0')}.txt`, writeBulletin(advisory)]),
  ]);
}

/** A feature a line, so that a change shows as lines. */
const featuresOf = ({ features }: { features: readonly object[] }): string => `{"type":"FeatureCollection","features":[\n${features.map((feature) => JSON.stringify(feature)).join(',\n')}\n]}\n`;

function worldJson({ towns }: World): string {
  const places = towns.map(({ name, x, y, people, rank }) => ({ name, ...placeOf(x, y), people, rank }));
  return `${JSON.stringify({ country: COUNTRY, eventName: EVENT_NAME, timeZone: TIME_ZONE, view: { longitude: -48.5, latitude: 25.1, zoom: 6.9 }, places, layers: LAYERS }, null, 1)}\n`;
}
