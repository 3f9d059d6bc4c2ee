// The planetary sets of a unit drawn from their tooth counts, with what each gear holds and how fast each member turns.
import { useState } from 'react';
import type { Gears, PlanetaryGears, PlanetSet, PowerStep } from '../../shared/catalogue/gear-layout';
import { solveStep } from '../../shared/gearing/family-ratios';
import { toNumber, type Fraction } from '../../shared/gearing/fraction';
import { membersOf } from '../../shared/gearing/gearset';
import { Planetary, type PlanetaryMember } from '../ui/art/planetary';
import { Segment } from '../ui/form/segment';
import { memberWords, ratioWords, setWords } from './family-words';

type Speeds = Readonly<Record<string, Fraction | null>>;

const NO_SPEEDS: Speeds = {};

function heldIn(set: PlanetSet, hold: readonly string[]): PlanetaryMember | undefined {
  const is = (part: string): boolean => hold.includes(`${set.name}.${part}`);
  if (is('carrier')) return 'carrier';
  if (is('ring')) return 'ring';
  return is(set.type === 'simple' ? 'sun' : 'largeSun') ? 'sun' : undefined;
}

const speedWords = (speed: Fraction | null | undefined): string => {
  if (speed === undefined || speed === null) return 'free';
  if (speed.n === 0n) return 'held';
  return ratioWords(toNumber(speed));
};

function Teeth({ set }: { readonly set: PlanetSet }) {
  const parts =
    set.type === 'simple'
      ? [`Sun ${set.sun}`, `${set.planets} planets of ${set.planet}`, `ring ${set.ring}`]
      : [
          `Small sun ${set.smallSun}`,
          `large sun ${set.largeSun}`,
          `${set.planets} short planets of ${set.shortPlanet}`,
          `${set.planets} long of ${set.longPlanet}`,
          `ring ${set.ring}`,
        ];
  return <p className="sm">{parts.join(', ')}</p>;
}

interface SetPictureProps {
  readonly set: PlanetSet;
  readonly hold: readonly string[];
  readonly speeds: Speeds;
}

function SetPicture({ set, hold, speeds }: SetPictureProps) {
  const held = heldIn(set, hold);
  const sun = set.type === 'simple' ? set.sun : set.largeSun;
  const planet = set.type === 'simple' ? set.planet : set.longPlanet;
  const name = setWords(set.name);
  return (
    <figure className="gear-picture">
      <figcaption>
        {name && <h3>{name.charAt(0).toUpperCase() + name.slice(1)} set</h3>}
        <Teeth set={set} />
        {set.type === 'ravigneaux' && (
          <p className="sm mute">Drawn with its large sun and long planets; the small sun stands behind.</p>
        )}
      </figcaption>
      <Planetary
        sunTeeth={sun}
        ringTeeth={set.ring}
        planetTeeth={planet}
        planets={set.planets}
        {...(held ? { held } : {})}
      />
      <dl className="gear-speeds num">
        {membersOf(set).map((member) => (
          <div key={member}>
            <dt>{memberWords(member).replace(`${name} `, '')}</dt>
            <dd>{speedWords(speeds[member])}</dd>
          </div>
        ))}
      </dl>
    </figure>
  );
}

function speedsIn(gears: PlanetaryGears, step: PowerStep): Speeds {
  const turning = solveStep(gears, step);
  return turning.outcome === 'turns' ? turning.speeds : NO_SPEEDS;
}

function PlanetaryPictures({ gears }: { readonly gears: PlanetaryGears }) {
  const [gear, setGear] = useState(gears.steps[0]?.gear ?? '1');
  const step = gears.steps.find((one) => one.gear === gear);
  if (!step) return null;
  const speeds = speedsIn(gears, step);
  return (
    <div className="grid gap-18">
      <Segment
        legend="Gear shown"
        tight
        value={gear}
        options={gears.steps.map((one) => ({ value: one.gear, label: one.gear }))}
        onChange={setGear}
      />
      <div className="gear-pictures">
        {gears.sets.map((set) => (
          <SetPicture key={set.name} set={set} hold={step.hold} speeds={speeds} />
        ))}
      </div>
      <p className="sm mute">
        Hatched is held against the case. Figures are turns for each turn of the input shaft; a minus turns
        backwards.
      </p>
    </div>
  );
}

/** Whether a unit has planetary gears to draw. */
export const hasPictures = (gears: Gears): boolean =>
  gears.type === 'planetary' || gears.type === 'planetary_low';

export function GearPictures({ gears }: { readonly gears: Gears }) {
  if (gears.type === 'planetary') return <PlanetaryPictures gears={gears} />;
  if (gears.type !== 'planetary_low') return null;
  const { sun, ring, planet, planets } = gears;
  const lowGears: PlanetaryGears = {
    type: 'planetary',
    layout: 'simpson',
    sets: [{ type: 'simple', name: 'low', sun, ring, planet, planets }],
    links: [],
    output: 'low.carrier',
    steps: [
      { gear: 'L', drive: ['low.sun'], hold: ['low.ring'], lock: [] },
      { gear: 'H', drive: ['low.sun'], hold: [], lock: [['low.sun', 'low.carrier']] },
    ],
  };
  return <PlanetaryPictures gears={lowGears} />;
}
