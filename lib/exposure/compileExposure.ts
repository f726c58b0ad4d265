import type { Position } from 'geojson';
import { assetPlaces } from './assetPlaces';
import type { Exposure } from './exposure';
import { hilbertDistance } from './hilbert';
import { insideArea } from './insideArea';
import { milli } from './milli';
import { SURFACES } from './model';
import type { Asset, LayerData, Surface, Zone } from './model';
import { zoneIndex } from './zoneIndex';

/** Who owns a run of places: an asset, or nobody but the people who live there. */
interface Owner {
  asset: number;
  places: Position[];
  /** Which place stands for it. */
  middle: number;
  people: number;
  zone: number;
  surface: Surface | null;
}

/**
 * Puts an event's layers into typed arrays. People are counted from the population cells; a zone's own figure counts only where
 * no cell lies in it, spread over places inside it. Where zones overlap the first holds the people, so that nobody is counted
 * twice: the total is always the sum of the zones and of those outside. People are summed in whole thousandths, so that totals
 * do not depend on the order of rows.
 */
export function compileExposure(layers: readonly { layerId: string; data: LayerData }[], surfaceAt: (lat: number, lon: number) => Surface): Exposure {
  const zones = layers.flatMap(({ layerId, data }) => (data.kind === 'zones' ? data.zones.map((zone) => ({ layer: layerId, zone })) : []));
  const assets = layers.flatMap(({ layerId, data }) => (data.kind === 'assets' ? data.assets.map((asset) => ({ layer: layerId, asset })) : []));
  const classIndex = new Map<string, number>();
  for (const { asset } of assets) if (!classIndex.has(asset.class)) classIndex.set(asset.class, classIndex.size);

  const people = peopleOwners(layers, zones.map(({ zone }) => zone));
  const owners = alongCurve([...people, ...assets.map(({ asset }, i) => assetOwner(asset, i))]);
  const zoneMilli = new Float64Array(zones.length);
  let totalMilli = 0;
  for (const owner of people) {
    totalMilli += milli(owner.people);
    if (owner.zone >= 0) zoneMilli[owner.zone] += milli(owner.people);
  }
  return {
    places: placesOf(owners, surfaceAt),
    assets: {
      count: assets.length,
      layer: assets.map(({ layer }) => layer),
      id: assets.map(({ asset }) => asset.id),
      name: assets.map(({ asset }) => asset.name),
      classIndex: Uint16Array.from(assets, ({ asset }) => classIndex.get(asset.class)!),
      people: assets.map(({ asset }) => asset.people),
      ...assetRuns(owners, assets.length),
    },
    classes: [...classIndex.keys()],
    zones: zones.map(({ layer, zone }, z) => ({ layer, id: zone.id, name: zone.name, clearanceHours: zone.clearanceHours, people: zoneMilli[z] / 1000 })),
    peopleTotal: totalMilli / 1000,
    peopleInZones: zoneMilli.reduce((sum, count) => sum + count, 0) / 1000,
  };
}

function peopleOwners(layers: readonly { data: LayerData }[], zones: readonly Zone[]): Owner[] {
  const zoneOf = zoneIndex(zones);
  const owners: Owner[] = [];
  const counted = new Set<number>();
  for (const { data } of layers) {
    if (data.kind !== 'population') continue;
    const { count, lat, lon, people } = data.cells;
    for (let i = 0; i < count; i++) {
      const zone = zoneOf(lat[i], lon[i]);
      counted.add(zone);
      owners.push(peopleAt([lon[i], lat[i]], people[i], zone));
    }
  }
  zones.forEach((zone, z) => {
    if (counted.has(z)) return;
    const inside = insideArea(zone.geometry);
    // Whole thousandths, shared so that they add up to the figure itself.
    const upTo = (k: number): number => Math.round((milli(zone.people ?? 0) * k) / inside.length);
    inside.forEach((place, k) => owners.push(peopleAt(place, (upTo(k + 1) - upTo(k)) / 1000, z)));
  });
  return owners;
}

const peopleAt = (place: Position, people: number, zone: number): Owner => ({ asset: -1, places: [place], middle: 0, people, zone, surface: null });

const assetOwner = (asset: Asset, index: number): Owner => ({ asset: index, ...assetPlaces(asset.geometry), people: 0, zone: -1, surface: asset.surface });

/** Owners in the order in which a Hilbert curve over their bounds passes the places that stand for them. */
function alongCurve(owners: readonly Owner[]): Owner[] {
  let [west, south, east, north] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const { places, middle } of owners) {
    const [lon, lat] = places[middle];
    west = Math.min(west, lon);
    east = Math.max(east, lon);
    south = Math.min(south, lat);
    north = Math.max(north, lat);
  }
  const side = Math.max(east - west, north - south) || 1;
  const at = Float64Array.from(owners, ({ places, middle }) => hilbertDistance((places[middle][0] - west) / side, (places[middle][1] - south) / side));
  return owners.map((_, i) => i).sort((a, b) => at[a] - at[b] || a - b).map((i) => owners[i]);
}

function placesOf(owners: readonly Owner[], surfaceAt: (lat: number, lon: number) => Surface): Exposure['places'] {
  const count = owners.reduce((sum, owner) => sum + owner.places.length, 0);
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
    for (const [lon, lat] of owner.places) {
      places.lat[i] = lat;
      places.lon[i] = lon;
      places.surface[i] = SURFACES.indexOf(owner.surface ?? surfaceAt(lat, lon));
      places.people[i] = owner.people;
      places.zone[i] = owner.zone;
      places.asset[i] = owner.asset;
      i++;
    }
  }
  return places;
}

function assetRuns(owners: readonly Owner[], count: number): Pick<Exposure['assets'], 'firstPlace' | 'placeCount' | 'lat' | 'lon'> {
  const runs = { firstPlace: new Uint32Array(count), placeCount: new Uint32Array(count), lat: new Float64Array(count), lon: new Float64Array(count) };
  let place = 0;
  for (const { asset, places, middle } of owners) {
    if (asset >= 0) {
      runs.firstPlace[asset] = place;
      runs.placeCount[asset] = places.length;
      [runs.lon[asset], runs.lat[asset]] = places[middle];
    }
    place += places.length;
  }
  return runs;
}
