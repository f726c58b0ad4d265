import type { Exposure } from './exposure';
import { hilbertDistance } from './hilbert';
import { SURFACES } from './model';
import type { Asset, LayerData, Surface, Zone } from './model';
import { assetPlaces, insideArea } from './samplePlaces';
import { zoneIndex } from './zoneIndex';

/** Who owns a run of places: an asset, or nobody but the people who live there. */
interface Owner {
  asset: number;
  lat: number[];
  lon: number[];
  people: number;
  zone: number;
  surface: Surface | null;
}

/**
 * Puts an event's layers into typed arrays. People are counted from the population cells; a zone's own figure counts only where
 * no cell lies in it, spread over places inside it. Where zones overlap the first holds the people, so that nobody is counted
 * twice: the total is always the sum of the zones and of those outside.
 */
export function compileExposure(layers: readonly { layerId: string; data: LayerData }[], surfaceAt: (lat: number, lon: number) => Surface): Exposure {
  const zones = layers.flatMap(({ layerId, data }) => (data.kind === 'zones' ? data.zones.map((zone) => ({ layer: layerId, zone })) : []));
  const assets = layers.flatMap(({ layerId, data }) => (data.kind === 'assets' ? data.assets.map((asset) => ({ layer: layerId, asset })) : []));
  const zoneOf = zoneIndex(zones.map(({ zone }) => zone));
  const classes = [...new Set(assets.map(({ asset }) => asset.class))];

  const people = peopleOwners(layers, zones.map(({ zone }) => zone), zoneOf);
  const owners = alongCurve([...people, ...assets.map(({ asset }, i) => assetOwner(asset, i))]);
  const places = placesOf(owners, surfaceAt);
  const { firstPlace, placeCount, lat, lon } = assetPlaceRuns(owners, assets.length);
  const zonePeople = new Float64Array(zones.length);
  let peopleTotal = 0;
  for (const owner of people) {
    peopleTotal += owner.people;
    if (owner.zone >= 0) zonePeople[owner.zone] += owner.people;
  }
  return {
    places,
    assets: {
      count: assets.length,
      layer: assets.map(({ layer }) => layer),
      id: assets.map(({ asset }) => asset.id),
      name: assets.map(({ asset }) => asset.name),
      classIndex: Uint16Array.from(assets, ({ asset }) => classes.indexOf(asset.class)),
      people: assets.map(({ asset }) => asset.people),
      lat,
      lon,
      firstPlace,
      placeCount,
    },
    classes,
    zones: zones.map(({ layer, zone }, z) => ({ layer, id: zone.id, name: zone.name, clearanceHours: zone.clearanceHours, people: zonePeople[z] })),
    peopleTotal,
    peopleInZones: zonePeople.reduce((sum, count) => sum + count, 0),
  };
}

function peopleOwners(layers: readonly { data: LayerData }[], zones: readonly Zone[], zoneOf: (lat: number, lon: number) => number): Owner[] {
  const owners: Owner[] = [];
  const counted = new Set<number>();
  for (const { data } of layers) {
    if (data.kind !== 'population') continue;
    const { count, lat, lon, people } = data.cells;
    for (let i = 0; i < count; i++) {
      const zone = zoneOf(lat[i], lon[i]);
      counted.add(zone);
      owners.push({ asset: -1, lat: [lat[i]], lon: [lon[i]], people: people[i], zone, surface: null });
    }
  }
  zones.forEach((zone, z) => {
    if (counted.has(z)) return;
    const inside = insideArea(zone.geometry);
    for (const [lon, lat] of inside) owners.push({ asset: -1, lat: [lat], lon: [lon], people: (zone.people ?? 0) / inside.length, zone: z, surface: null });
  });
  return owners;
}

function assetOwner(asset: Asset, index: number): Owner {
  const places = assetPlaces(asset.geometry);
  return { asset: index, lat: places.map(([, lat]) => lat), lon: places.map(([lon]) => lon), people: 0, zone: -1, surface: asset.surface };
}

/** Owners in the order in which a Hilbert curve over their bounds passes their first places. */
function alongCurve(owners: Owner[]): Owner[] {
  let [west, south, east, north] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const { lat, lon } of owners) {
    west = Math.min(west, lon[0]);
    east = Math.max(east, lon[0]);
    south = Math.min(south, lat[0]);
    north = Math.max(north, lat[0]);
  }
  const side = Math.max(east - west, north - south) || 1;
  const at = owners.map(({ lat, lon }) => hilbertDistance((lon[0] - west) / side, (lat[0] - south) / side));
  return owners.map((_, i) => i).sort((a, b) => at[a] - at[b] || a - b).map((i) => owners[i]);
}

function placesOf(owners: readonly Owner[], surfaceAt: (lat: number, lon: number) => Surface): Exposure['places'] {
  const count = owners.reduce((sum, { lat }) => sum + lat.length, 0);
  const places = {
    count,
    lat: new Float64Array(count),
    lon: new Float64Array(count),
    surface: new Uint8Array(count),
    people: new Float64Array(count),
    zone: new Int32Array(count),
    asset: new Int32Array(count),
  };
  let i = 0;
  for (const owner of owners) {
    for (let k = 0; k < owner.lat.length; k++, i++) {
      places.lat[i] = owner.lat[k];
      places.lon[i] = owner.lon[k];
      places.surface[i] = SURFACES.indexOf(owner.surface ?? surfaceAt(owner.lat[k], owner.lon[k]));
      places.people[i] = owner.people;
      places.zone[i] = owner.zone;
      places.asset[i] = owner.asset;
    }
  }
  return places;
}

function assetPlaceRuns(owners: readonly Owner[], count: number) {
  const runs = { firstPlace: new Uint32Array(count), placeCount: new Uint32Array(count), lat: new Float64Array(count), lon: new Float64Array(count) };
  let place = 0;
  for (const { asset, lat, lon } of owners) {
    if (asset >= 0) {
      const middle = lat.length >> 1;
      runs.firstPlace[asset] = place;
      runs.placeCount[asset] = lat.length;
      runs.lat[asset] = lat[middle];
      runs.lon[asset] = lon[middle];
    }
    place += lat.length;
  }
  return runs;
}
