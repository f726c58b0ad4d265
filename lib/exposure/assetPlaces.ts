import type { Position } from 'geojson';
import { alongLine } from './alongLine';
import { insideArea } from './insideArea';
import type { Asset } from './model';

export interface AssetPlaces {
  places: Position[];
  /** Which of the places stands for the asset on a map. */
  middle: number;
}

/** Positions at which an asset's wind is asked for: a point itself, a line every two kilometres, an area inside and along its outlines. */
export function assetPlaces(geometry: Asset['geometry']): AssetPlaces {
  switch (geometry.type) {
    case 'Point':
      return { places: [geometry.coordinates], middle: 0 };
    case 'LineString':
      return middleOf(alongLine(geometry.coordinates));
    case 'MultiLineString':
      return middleOf(geometry.coordinates.flatMap(alongLine));
    case 'Polygon':
      return areaPlaces(insideArea(geometry), [geometry.coordinates[0]]);
    case 'MultiPolygon':
      return areaPlaces(insideArea(geometry), geometry.coordinates.map(([outline]) => outline));
  }
}

const middleOf = (places: Position[]): AssetPlaces => ({ places, middle: places.length >> 1 });

const areaPlaces = (inside: Position[], outlines: readonly Position[][]): AssetPlaces => ({
  places: [...inside, ...outlines.flatMap((outline) => alongLine(outline).slice(0, -1))],
  middle: inside.length >> 1,
});
