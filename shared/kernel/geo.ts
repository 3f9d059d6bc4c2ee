// Distance between two places on the ground.

export interface Place {
  /** Degrees, north positive. */
  readonly lat: number;
  /** Degrees, east positive. */
  readonly lon: number;
}

/** Mean radius of the earth (IUGG), metres. */
const RADIUS_M = 6_371_008.8;
const METRES_PER_MILE = 1_609.344;

const radians = (degrees: number): number => (degrees * Math.PI) / 180;

/**
 * Great-circle distance in statute miles by the haversine formula on a sphere; within 0.5 % of the geodesic on the
 * ellipsoid. Say "about" beside it: the road is longer.
 */
export function milesBetween(a: Place, b: Place): number {
  const dLat = radians(b.lat - a.lat);
  const dLon = radians(b.lon - a.lon);
  const h =
    Math.sin(dLat / 2) ** 2 + Math.cos(radians(a.lat)) * Math.cos(radians(b.lat)) * Math.sin(dLon / 2) ** 2;
  // Rounding may push h a hair above 1 for opposite points.
  return (2 * RADIUS_M * Math.asin(Math.min(1, Math.sqrt(h)))) / METRES_PER_MILE;
}
