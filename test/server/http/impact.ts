import { tabulate } from '../../../lib/impact';
import type { Impact } from '../../../lib/impact';
import type { StoredAdvisory } from '../../../lib/wire';
import { writeAssets } from '../../../server/compute/bulk';
import { hazardOf, smallExposure } from '../../impact/world';

/** Two zones and two assets: names that a spreadsheet would run, part or garble. */
export const NAMES = { formula: '=HYPERLINK("http://x";"y")', parted: 'Orrin Bar, south; "old"\u2014\u00e9' };

function exposure() {
  const small = smallExposure();
  return { ...small, zones: [{ ...small.zones[0], name: NAMES.formula }, { ...small.zones[1], name: NAMES.parted }], assets: { ...small.assets, name: ['-Hale Point', 'Feeder 1'] } };
}

const results = ({ id, eventId, issuedAt }: StoredAdvisory) =>
  tabulate(
    { eventId, advisoryId: id, issuedAtMs: Date.parse(issuedAt), nowMs: Date.parse(issuedAt), seed: -7, computedAt: '2031-09-19T09:31:00.000Z' },
    exposure(),
    hazardOf([70, 66, 40, 20, 65, 36, 52], [[6, 8, 10], [6, 8, 11], [9, null, null], [null, null, null], [6, 8, 10], [9, null, null], [8, 10, null]]),
    null,
    null,
  );

export const tabulated = (advisory: StoredAdvisory): Omit<Impact, 'revision'> => results(advisory).impact;
export const assetTableOf = (advisory: StoredAdvisory) => writeAssets(exposure(), results(advisory).assets);
