// Plane geometry the drawings share: points on circles, outlines with ears or teeth, and gear wheels.

export type Point = readonly [x: number, y: number];

/** SVG needs no more than two decimals. */
export const twoDecimals = (value: number): string => String(Math.round(value * 100) / 100);

/** The point at an angle (radians, clockwise from the right because y points down) on a circle. */
export const polar = (cx: number, cy: number, radius: number, angle: number): Point => [
  cx + radius * Math.cos(angle),
  cy + radius * Math.sin(angle),
];

/** A closed path through points. */
export const closed = (points: readonly Point[]): string =>
  `${points.map(([x, y], index) => `${index === 0 ? 'M' : 'L'}${twoDecimals(x)} ${twoDecimals(y)}`).join('')}Z`;

/** Angles all the way round, in equal steps. */
export const around = (count: number, offset = 0): number[] =>
  Array.from({ length: count }, (_, index) => offset + (index * 2 * Math.PI) / count);

/** Radius at an angle of a flange with round ears. */
export function ears(
  radius: number,
  count: number,
  height: number,
  offset = 0,
  halfWidth = 0.16,
): (angle: number) => number {
  return (angle) => {
    let value = radius;
    for (const ear of around(count, offset)) {
      const away = Math.abs(((angle - ear + Math.PI * 3) % (2 * Math.PI)) - Math.PI);
      if (away < halfWidth) {
        value = Math.max(value, radius + height * Math.cos(((away / halfWidth) * Math.PI) / 2) ** 0.7);
      }
    }
    return value;
  };
}

/** Radius at an angle of a wheel with square teeth (or splines). */
export function toothed(count: number, radius: number, height: number): (angle: number) => number {
  return (angle) => {
    const phase = ((angle * count) / (2 * Math.PI)) % 1;
    return radius + (phase > 0.25 && phase < 0.75 ? height : 0);
  };
}

/** A round outline whose radius depends on the angle. */
export const outline = (cx: number, cy: number, radiusAt: (angle: number) => number, steps = 360): string =>
  closed(around(steps).map((angle) => polar(cx, cy, radiusAt(angle), angle)));

/** A spline bore: four points for each tooth, two out and two in. */
export const splineBore = (cx: number, cy: number, teeth: number, outer: number, inner: number): string =>
  closed(around(teeth * 4).map((angle, index) => polar(cx, cy, index % 4 < 2 ? outer : inner, angle)));

export interface GearShape {
  readonly cx: number;
  readonly cy: number;
  readonly teeth: number;
  /** Pitch diameter divided by tooth count, in drawing units. */
  readonly module: number;
  readonly rotation?: number;
  /** A ring gear: its teeth point inward. */
  readonly internal?: boolean;
}

/** A gear wheel with straight-sided teeth; addendum and dedendum follow the module. */
export function gearPath({ cx, cy, teeth, module, rotation = 0, internal = false }: GearShape): string {
  const pitchRadius = (module * teeth) / 2;
  const tip = internal ? pitchRadius - module * 0.8 : pitchRadius + module * 0.82;
  const root = internal ? pitchRadius + module * 1.1 : pitchRadius - module * 1.1;
  const pitch = (2 * Math.PI) / teeth;
  const corners: readonly Point[] = [
    [root, -0.31],
    [tip, -0.12],
    [tip, 0.12],
    [root, 0.31],
  ];
  return closed(
    around(teeth, rotation).flatMap((angle) =>
      corners.map(([radius, share]) => polar(cx, cy, radius, angle + share * pitch)),
    ),
  );
}
