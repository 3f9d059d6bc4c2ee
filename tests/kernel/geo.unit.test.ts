import { Geodesic } from 'geographiclib-geodesic';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { locateZip } from '../../server/geo/zip';
import { milesBetween } from '../../shared/kernel/geo';

const geodesicMiles = (a: { lat: number; lon: number }, b: { lat: number; lon: number }): number =>
  (Geodesic.WGS84.Inverse(a.lat, a.lon, b.lat, b.lon).s12 ?? Number.NaN) / 1_609.344;

describe('distance', () => {
  test('within 0.5 % of the geodesic on WGS 84 (geographiclib-geodesic 2.2.0) inside the contiguous states', () => {
    const lat = fc.double({ min: 25, max: 49, noNaN: true });
    const lon = fc.double({ min: -124, max: -67, noNaN: true });
    fc.assert(
      fc.property(lat, lon, lat, lon, (lat1, lon1, lat2, lon2) => {
        const a = { lat: lat1, lon: lon1 };
        const b = { lat: lat2, lon: lon2 };
        const exact = geodesicMiles(a, b);
        expect(Math.abs(milesBetween(a, b) - exact)).toBeLessThanOrEqual(exact * 0.005 + 1e-6);
      }),
      { numRuns: 500 },
    );
  });

  test('New York (10001) to Beverly Hills (90210) is 2,458.829 miles by Karney’s geodesic on Census points', () => {
    const from = { lat: 40.750_649, lon: -73.997_298 };
    const to = { lat: 34.100_517, lon: -118.414_712 };
    expect(Math.abs(milesBetween(from, to) - 2_458.829) / 2_458.829).toBeLessThan(0.005);
  });

  test('opposite points are a number, and a place is no distance from itself', () => {
    expect(milesBetween({ lat: 30, lon: 20 }, { lat: -30, lon: -160 })).toBeGreaterThan(12_000);
    expect(milesBetween({ lat: 43.6, lon: -116.2 }, { lat: 43.6, lon: -116.2 })).toBe(0);
  });
});

describe('a ZIP code', () => {
  test.each([
    ['83702', 'Boise', 'ID', 'America/Boise'],
    ['60601', 'Chicago', 'IL', 'America/Chicago'],
    ['85001', 'Phoenix', 'AZ', 'America/Phoenix'],
    ['79901', 'El Paso', 'TX', 'America/Denver'],
    ['37902', 'Knoxville', 'TN', 'America/New_York'],
  ])('%s is %s, %s in %s', (zip, city, state, timeZone) => {
    expect(locateZip(zip)).toMatchObject({ city, state, timeZone });
  });

  test.each(['00000', '1234', 'ABCDE', '09001'])('%s has no place we know', (zip) => {
    expect(locateZip(zip)).toBeNull();
  });
});
