import { expect, test } from 'vitest';
import { basinOf } from '../../lib/members';

// Best-track basins of the US National Hurricane Center and Joint Typhoon Warning Center (common practice for the divides).
test.each([
  ['the Gulf of Mexico', 25, -90, 'atlantic'],
  ['off Cape Verde', 14, -25, 'atlantic'],
  ['the Gulf of Honduras', 17, -87, 'atlantic'],
  ['off Acapulco', 15, -101, 'eastern-north-pacific'],
  ['off El Salvador', 12, -89.5, 'eastern-north-pacific'],
  ['south of Hawaii', 15, -157, 'eastern-north-pacific'],
  ['the Philippine Sea', 15, 130, 'western-north-pacific'],
  ['the Bay of Bengal', 15, 88, 'western-north-pacific'],
  ['the Coral Sea', -16, 150, 'southern-hemisphere'],
])('%s', (_, lat, lon, basin) => {
  expect(basinOf(lat, lon)).toBe(basin);
});
