/**
 * Layers compiled for the kernel, structure of arrays. Places lie along a Hilbert curve, so that neighbours in the arrays are
 * neighbours on the ground; the places of one asset are consecutive.
 */
export interface Exposure {
  places: {
    count: number;
    lat: Float64Array;
    lon: Float64Array;
    /** Index in SURFACES. */
    surface: Uint8Array;
    /** People living at the place; 0 at the places of assets. */
    people: Float64Array;
    /** Zone of a people place, -1 outside all zones and for places of assets. */
    zone: Int32Array;
    /** Asset of a place, -1 for people places. */
    asset: Int32Array;
  };
  assets: {
    count: number;
    layer: string[];
    id: string[];
    name: string[];
    classIndex: ArrayLike<number>;
    people: (number | null)[];
    lat: ArrayLike<number>;
    lon: ArrayLike<number>;
    firstPlace: ArrayLike<number>;
    placeCount: ArrayLike<number>;
  };
  classes: string[];
  zones: ExposedZone[];
  peopleTotal: number;
  peopleInZones: number;
}

export interface ExposedZone {
  layer: string;
  id: string;
  name: string;
  clearanceHours: number | null;
  people: number;
}
