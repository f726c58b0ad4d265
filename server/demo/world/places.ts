import type { Km } from './frame';
import type { Land } from './land';

/** A town: `rank` 1 is the city, 4 the smallest that a map names. `isle`: no road leads there. */
export interface Town extends Km {
  name: string;
  people: number;
  rank: number;
  isle: boolean;
}

type Row = readonly [name: string, x: number, y: number, thousands: number, rank: number];

/** The towns, where they lie (km) and how many thousand people live in and around each. */
const MAINLAND: readonly Row[] = [
  ['Port Ansel W', -15, -28, 262, 1],
  ['Port Ansel E', 2, -19, 214, 1],
  ['Saltmarsh', -37, -37, 62, 2],
  ['Orrin Bar', 30, -60, 66, 2],
  ['Brackwater', -18, -49, 26, 3],
  ['Hale Point', 43, -50, 27, 2],
  ['Tarn Valley', -32, 16, 66, 2],
  ['Westering', -163, -2, 92, 2],
  ['Fell Head', 22, 92, 14, 3],
  ['Marrick Haven', 98, 36, 104, 2],
  ['Sallow Quay', 70, -20, 78, 2],
  ['Tollen Cross', 38, 10, 58, 2],
  ['Great Heddon', -74, 14, 61, 2],
  ['Cold Staithe', 3, 28, 47, 3],
  ['Amber Roads', 72, 52, 33, 3],
  ['Gannet Hythe', 150, 60, 25, 3],
  ['Lantern Bay', -98, 88, 17, 3],
  ['Stonnard', -106, -14, 52, 2],
  ['Osier Gate', -54, -46, 44, 3],
  ['Long Tern', -78, -63, 9, 4],
  ['Culver Sands', 92, -38, 22, 3],
  ['Skarne', 118, -6, 38, 3],
  ['Brindle Ford', 92, 8, 29, 3],
  ['Nether Quill', -92, -38, 31, 3],
  ['Wrayburn', -62, 54, 36, 3],
  ['Ardle', -132, 16, 22, 3],
  ['Sparrow Lees', 24, -36, 41, 3],
  ['Dunmallow', -46, -6, 35, 3],
  ['Pellan Deep', 44, 60, 24, 4],
  ['Easter Cove', 132, 24, 28, 3],
];
const ISLES: readonly Row[] = [
  ['Outer Lamb', 196, 34, 4, 3],
  ['Inner Lamb', 184, -10, 2, 4],
  ['Wether Isle', -186, -48, 21, 3],
  ['Norrow', 4, 116, 5, 4],
  ['Little Pell', 76, 112, 3, 4],
  ['Farrow Holm', -194, 24, 4, 4],
];

/** Distance (km) from the coast that keeps a place on land once its coordinates are rounded and the coast is thinned. */
export const SAFE_KM = 0.25;

export function townsOf(land: Land): Town[] {
  const rows = [...MAINLAND.map((row) => ({ row, isle: false })), ...ISLES.map((row) => ({ row, isle: true }))];
  return rows.map(({ row: [name, x, y, thousands, rank], isle }) => ({ name, ...ashore(land, { x, y }), people: thousands * 1000, rank, isle }));
}

/** The nearest place to a wish that is safely on land. */
export function ashore(land: Land, wish: Km): Km {
  for (let reach = 0; reach < 30; reach += 0.3) {
    for (let k = 0; k < 24; k++) {
      const x = wish.x + reach * Math.cos((k * Math.PI) / 12);
      const y = wish.y + reach * Math.sin((k * Math.PI) / 12);
      if (land.inlandKm(x, y) > 0.6) return { x, y };
    }
  }
  throw new Error(`No land within 30 km of ${wish.x}, ${wish.y} km.`);
}

const FIRST = ['Alder', 'Bracken', 'Cinder', 'Drift', 'Ember', 'Fallow', 'Gorse', 'Hobb', 'Ivy', 'Sorrel', 'Kelp', 'Lark', 'Mallow', 'Nettle', 'Otter', 'Plover', 'Quern', 'Rush', 'Sedge', 'Thrift', 'Umber', 'Vetch', 'Whin', 'Yarrow', 'Curlew', 'Teasel', 'Tansy', 'Withy'];
const LAST = ['wick', 'stead', ' Ness', 'holme', ' Strand', 'combe', ' Hythe', ' Gate', ' Pool', ' Fleet', 'garth', ' Reach', ' Landing', ' Creek', 'marsh'];

/** Invented names, none given twice, in a fixed order that mixes beginnings and ends. */
export function* inventedNames(): Generator<string, never> {
  for (let k = 0; ; k++) {
    const turn = Math.floor(k / FIRST.length);
    const name = `${FIRST[(k * 11) % FIRST.length]}${LAST[(k * 4 + turn * 7) % LAST.length]}`;
    yield turn < LAST.length ? name : `${name} ${turn - LAST.length + 2}`;
  }
}
