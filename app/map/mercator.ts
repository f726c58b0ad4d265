/** Web Mercator as the map draws it: the world is 512 px wide at zoom 0, north up. Degrees in, pixels out. */
export interface Camera {
  lon: number;
  lat: number;
  zoom: number;
}
export interface Size {
  width: number;
  height: number;
}
export interface Bounds {
  west: number;
  south: number;
  /** May exceed 180 where the box crosses the 180th meridian. */
  east: number;
  north: number;
}

const TILE = 512;
export const MAX_LAT = 85.05;
const radians = Math.PI / 180;

export const worldX = (lon: number, zoom: number): number => (TILE * 2 ** zoom * (lon + 180)) / 360;
export function worldY(lat: number, zoom: number): number {
  const held = Math.max(-MAX_LAT, Math.min(MAX_LAT, lat));
  return TILE * 2 ** zoom * (0.5 - Math.log(Math.tan(Math.PI / 4 + (held * radians) / 2)) / (2 * Math.PI));
}
const lonAt = (x: number, zoom: number): number => (x / (TILE * 2 ** zoom)) * 360 - 180;
const latAt = (y: number, zoom: number): number => (2 * Math.atan(Math.exp((0.5 - y / (TILE * 2 ** zoom)) * 2 * Math.PI)) - Math.PI / 2) / radians;

/** The turn of the globe in which `lon` lies nearest to `near`. */
export const nearestTurn = (lon: number, near: number): number => lon + 360 * Math.round((near - lon) / 360);

/** Pixel of a place, from the top left of the map. */
export function project(camera: Camera, size: Size, lon: number, lat: number): [number, number] {
  const x = worldX(nearestTurn(lon, camera.lon), camera.zoom) - worldX(camera.lon, camera.zoom) + size.width / 2;
  return [x, worldY(lat, camera.zoom) - worldY(camera.lat, camera.zoom) + size.height / 2];
}

/** Place under a pixel; longitude in -180..180. */
export function unproject(camera: Camera, size: Size, x: number, y: number): [number, number] {
  const lon = lonAt(worldX(camera.lon, camera.zoom) + x - size.width / 2, camera.zoom);
  return [nearestTurn(lon, 0), latAt(worldY(camera.lat, camera.zoom) + y - size.height / 2, camera.zoom)];
}

/** The camera moved by pixels (positive looks further east and south). */
export function panned(camera: Camera, dx: number, dy: number): Camera {
  const lon = nearestTurn(lonAt(worldX(camera.lon, camera.zoom) + dx, camera.zoom), 0);
  return { ...camera, lon, lat: Math.max(-80, Math.min(80, latAt(worldY(camera.lat, camera.zoom) + dy, camera.zoom))) };
}

export const ZOOM_RANGE = { least: 1.5, most: 13 } as const;
export const zoomed = (camera: Camera, by: number): Camera => ({ ...camera, zoom: Math.max(ZOOM_RANGE.least, Math.min(ZOOM_RANGE.most, camera.zoom + by)) });

export interface Padding {
  top: number;
  right: number;
  bottom: number;
  left: number;
}

/** The camera that shows all of `bounds` inside the padding, as large as it goes up to `mostZoom`. */
export function fitted(bounds: Bounds, size: Size, padding: Padding, mostZoom = 9): Camera {
  const width = Math.max(40, size.width - padding.left - padding.right);
  const height = Math.max(40, size.height - padding.top - padding.bottom);
  const spanX = Math.max(1e-6, worldX(bounds.east, 0) - worldX(bounds.west, 0));
  const spanY = Math.max(1e-6, worldY(bounds.south, 0) - worldY(bounds.north, 0));
  const zoom = Math.max(ZOOM_RANGE.least, Math.min(mostZoom, Math.log2(Math.min(width / spanX, height / spanY))));
  const middle: Camera = {
    lon: (bounds.west + bounds.east) / 2,
    lat: latAt((worldY(bounds.south, zoom) + worldY(bounds.north, zoom)) / 2, zoom),
    zoom,
  };
  return panned(middle, (padding.right - padding.left) / 2, (padding.bottom - padding.top) / 2);
}

/** The smallest box around places, the short way round the globe from the first. Null for none. */
export function boundsOf(places: Iterable<readonly [number, number]>): Bounds | null {
  let box: Bounds | null = null;
  let first = 0;
  for (const [lon, lat] of places) {
    if (!box) {
      first = lon;
      box = { west: lon, east: lon, south: lat, north: lat };
      continue;
    }
    const turned = nearestTurn(lon, first);
    box.west = Math.min(box.west, turned);
    box.east = Math.max(box.east, turned);
    box.south = Math.min(box.south, lat);
    box.north = Math.max(box.north, lat);
  }
  return box;
}

/** Ground kilometres of one pixel at the middle of the map (sphere of 6371.0088 km, the IUGG mean radius). */
export const kmPerPixel = (camera: Camera): number => (2 * Math.PI * 6371.0088 * Math.cos(camera.lat * radians)) / (TILE * 2 ** camera.zoom);
