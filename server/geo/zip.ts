// Where a ZIP code is, and which time zone its deadlines end in.
import zipcodes from 'zipcodes';
import type { Place } from '../../shared/kernel/geo';

export interface ZipPlace extends Place {
  readonly zip: string;
  readonly city: string;
  readonly state: string;
  readonly timeZone: string;
}

const EASTERN = 'America/New_York';
const CENTRAL = 'America/Chicago';
const MOUNTAIN = 'America/Denver';
const PACIFIC = 'America/Los_Angeles';

/** The zone most of a state keeps (from memory, IANA names). */
const ZONES: Readonly<Record<string, string>> = {
  ...Object.fromEntries(
    'CT DC DE FL GA KY MA MD ME MI NC NH NJ NY OH PA RI SC VA VT WV'.split(' ').map((s) => [s, EASTERN]),
  ),
  ...Object.fromEntries(
    'AL AR IA IL KS LA MN MO MS ND NE OK SD TN TX WI'.split(' ').map((s) => [s, CENTRAL]),
  ),
  ...Object.fromEntries('CO MT NM UT WY'.split(' ').map((s) => [s, MOUNTAIN])),
  ...Object.fromEntries('CA NV OR WA'.split(' ').map((s) => [s, PACIFIC])),
  IN: 'America/Indiana/Indianapolis',
  ID: 'America/Boise',
  AZ: 'America/Phoenix',
  AK: 'America/Anchorage',
  HI: 'Pacific/Honolulu',
  PR: 'America/Puerto_Rico',
  VI: 'America/St_Thomas',
  GU: 'Pacific/Guam',
  AS: 'Pacific/Pago_Pago',
  MP: 'Pacific/Saipan',
  PW: 'Pacific/Palau',
  FM: 'Pacific/Pohnpei',
  MH: 'Pacific/Majuro',
};

/** Parts of a state that keep another zone, by the first three digits (from memory). */
const ZONES_BY_PREFIX: Readonly<Record<string, string>> = {
  '324': CENTRAL,
  '325': CENTRAL,
  '373': EASTERN,
  '374': EASTERN,
  '376': EASTERN,
  '377': EASTERN,
  '378': EASTERN,
  '379': EASTERN,
  '420': CENTRAL,
  '421': CENTRAL,
  '422': CENTRAL,
  '423': CENTRAL,
  '424': CENTRAL,
  '463': CENTRAL,
  '464': CENTRAL,
  '476': CENTRAL,
  '477': CENTRAL,
  '577': MOUNTAIN,
  '586': MOUNTAIN,
  '693': MOUNTAIN,
  '798': MOUNTAIN,
  '799': MOUNTAIN,
  '835': PACIFIC,
  '838': PACIFIC,
  '979': MOUNTAIN,
};

const FIVE_DIGITS = /^\d{5}$/;

/** Mail to the forces: a code is a unit, not a place, and many rows stand at 0, 0. */
const FORCES: readonly string[] = ['AA', 'AE', 'AP'];
const WEST_PACIFIC: readonly string[] = ['GU', 'MP', 'PW', 'FM', 'MH'];

/** Some rows have lost the sign of a western longitude. */
const longitudeOf = (state: string, longitude: number): number =>
  WEST_PACIFIC.includes(state) ? longitude : -Math.abs(longitude);

/**
 * Looks a ZIP code up.
 * @returns null where there is no such code, or it is no place on the ground (mail to the forces)
 */
export function locateZip(zip: string): ZipPlace | null {
  if (!FIVE_DIGITS.test(zip)) return null;
  const found = zipcodes.lookup(zip);
  if (!found || FORCES.includes(found.state)) return null;
  const timeZone = ZONES_BY_PREFIX[zip.slice(0, 3)] ?? ZONES[found.state];
  if (!timeZone) return null;
  return {
    lat: found.latitude,
    lon: longitudeOf(found.state, found.longitude),
    zip,
    city: found.city,
    state: found.state,
    timeZone,
  };
}
