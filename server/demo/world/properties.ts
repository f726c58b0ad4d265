import type { Site } from './facilities';
import { placeOf } from './frame';
import type { Land } from './land';
import type { Town } from './places';
import type { Cell } from './population';
import type { Random } from './random';
import { drawer, near, nearestTown, numbered } from './spots';

const PROPERTIES = 50_000;

/** Share of insured buildings (percent) and median value by construction class. */
const CONSTRUCTION = [
  { name: 'timber-frame', percent: 36, medianValue: 210_000 },
  { name: 'masonry', percent: 39, medianValue: 280_000 },
  { name: 'reinforced-concrete', percent: 13, medianValue: 760_000 },
  { name: 'steel-frame', percent: 7, medianValue: 1_150_000 },
  { name: 'light-metal', percent: 5, medianValue: 95_000 },
] as const;
const TREES = ['Alder', 'Barley', 'Chandler', 'Dyke', 'Eel', 'Fern', 'Gull', 'Harbour', 'Infirmary', 'Kiln', 'Ladder', 'Mast', 'Net', 'Orchard', 'Pilot', 'Quay', 'Rope', 'Sail', 'Tanner', 'Vine', 'Weir', 'Weaver'];
const WAYS = ['Lane', 'Street', 'Row', 'Road', 'Walk', 'Close', 'Rise'];

export interface Property extends Site {
  value: number;
  constructionClass: string;
  deductible: number;
}

/** Insured buildings where people live. A deductible is a percentage of the value, as wind policies have it. */
export function makeProperties(towns: readonly Town[], cells: readonly Cell[], land: Land, random: Random): Property[] {
  const draw = drawer(cells, ({ people }) => people, random);
  const kinds = CONSTRUCTION.flatMap((kind) => Array.from({ length: kind.percent }, () => kind));
  return Array.from({ length: PROPERTIES }, (_, i) => {
    const spot = near(draw(), land, random);
    const kind = random.pick(kinds);
    const value = 1000 * Math.round(random.around(kind.medianValue, 0.45) / 1000);
    return {
      id: numbered('P', i, 5),
      name: `${random.whole(1, 180)} ${random.pick(TREES)} ${random.pick(WAYS)} (${nearestTown(towns, spot).name})`,
      ...placeOf(spot.x, spot.y),
      class: 'property',
      value,
      constructionClass: kind.name,
      deductible: 100 * Math.round((value * random.pick([0.01, 0.02, 0.02, 0.05])) / 100),
    };
  });
}
