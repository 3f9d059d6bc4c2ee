// Ratios of a catalogue family worked out from its tooth counts, whatever kind of gears it has.
import type { CountershaftGears, Gears, PlanetaryGears, PowerStep } from '../catalogue/gear-layout';
import { fraction, negative, ONE, times, type Fraction } from './fraction';
import { solveGearset, type Turning } from './gearset';

export interface GearRatio {
  /** '1' to '9', 'R', 'L' for low range; for an axle the ratio's own place in the list. */
  readonly gear: string;
  /** Null where the arrangement doesn't turn. */
  readonly ratio: Fraction | null;
}

/** What one step of the power flow does to the members. */
export const solveStep = (gears: PlanetaryGears, step: PowerStep): Turning =>
  solveGearset({
    sets: gears.sets,
    links: [...gears.links, ...step.lock],
    hold: step.hold,
    drive: step.drive,
    driven: gears.output,
  });

function planetaryRatios(gears: PlanetaryGears): GearRatio[] {
  return gears.steps.map((step) => {
    const turning = solveStep(gears, step);
    return { gear: step.gear, ratio: turning.outcome === 'turns' ? turning.ratio : null };
  });
}

function countershaftRatios(gears: CountershaftGears): GearRatio[] {
  const head = fraction(gears.counter, gears.input);
  const forward = gears.pairs.map((pair) => ({
    gear: pair.gear,
    ratio: times(head, fraction(pair.main, pair.counter)),
  }));
  const reverse = negative(times(head, fraction(gears.reverse.main, gears.reverse.counter)));
  const all = [...forward, { gear: gears.direct, ratio: ONE }].sort((a, b) => (a.gear < b.gear ? -1 : 1));
  return [...all, { gear: 'R', ratio: reverse }];
}

/** Ratio of every gear, exactly: input speed over output speed, negative for reverse. */
export function ratiosOf(gears: Gears): GearRatio[] {
  switch (gears.type) {
    case 'planetary':
      return planetaryRatios(gears);
    case 'countershaft':
      return countershaftRatios(gears);
    case 'planetary_low': {
      const turning = solveGearset({
        sets: [
          {
            type: 'simple',
            name: 'low',
            sun: gears.sun,
            ring: gears.ring,
            planet: gears.planet,
            planets: gears.planets,
          },
        ],
        links: [],
        hold: ['low.ring'],
        drive: ['low.sun'],
        driven: 'low.carrier',
      });
      return [
        { gear: 'H', ratio: ONE },
        { gear: 'L', ratio: turning.outcome === 'turns' ? turning.ratio : null },
      ];
    }
    case 'geared_low':
      return [
        { gear: 'H', ratio: ONE },
        {
          gear: 'L',
          ratio: times(fraction(gears.idlerIn, gears.input), fraction(gears.output, gears.idlerOut)),
        },
      ];
    case 'chain_only':
      return [{ gear: 'H', ratio: ONE }];
    case 'ring_and_pinion':
      return gears.pairs.map((pair, index) => ({
        gear: String(index + 1),
        ratio: fraction(pair.ring, pair.pinion),
      }));
  }
}
