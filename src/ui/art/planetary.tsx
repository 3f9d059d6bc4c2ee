// A planetary set seen from the end: teeth, phase and mesh follow from the tooth counts; a held member is hatched.
import clsx from 'clsx';
import { useId } from 'react';
import { around, gearPath, polar, twoDecimals } from './geometry';

export type PlanetaryMember = 'sun' | 'carrier' | 'ring';

interface PlanetaryProps {
  readonly sunTeeth: number;
  readonly ringTeeth: number;
  /** Left out: what the ring leaves room for, (ring - sun) / 2. */
  readonly planetTeeth?: number;
  readonly planets?: number;
  readonly held?: PlanetaryMember;
  readonly className?: string;
}

const SIZE = 300;
const CENTRE = SIZE / 2;
/** The first planet stands at twelve o'clock. */
const TOP = -Math.PI / 2;

const HELD_WORDS: Readonly<Record<PlanetaryMember, string>> = {
  sun: ', sun held',
  carrier: ', carrier held',
  ring: ', ring held',
};

export function Planetary({
  sunTeeth,
  ringTeeth,
  planetTeeth,
  planets = 3,
  held,
  className,
}: PlanetaryProps) {
  const hatch = useId();
  const planet = planetTeeth ?? (ringTeeth - sunTeeth) / 2;
  const module = (SIZE * 0.88) / (ringTeeth + 7);
  const outerRadius = (module * ringTeeth) / 2 + module * 3;
  const armRadius = (module * (sunTeeth + planet)) / 2;
  const angles = around(planets, TOP);
  /** Each planet's tooth meets a gap of the sun on the line between their centres. */
  const planetTurn = (angle: number) => angle + Math.PI - Math.PI / planet + (angle * sunTeeth) / planet;
  const ringTurn = TOP - ((TOP - planetTurn(TOP)) * planet) / ringTeeth - Math.PI / ringTeeth;
  const pins = angles.map((angle) => polar(CENTRE, CENTRE, armRadius, angle));
  const arms = pins.map(([x, y]) => `M${CENTRE} ${CENTRE}L${twoDecimals(x)} ${twoDecimals(y)}`).join('');
  const fill = (member: PlanetaryMember) => (held === member ? { fill: `url(#${hatch})` } : {});
  const label = `Planetary set: sun ${sunTeeth} teeth, ${planets} planets of ${planet} teeth, ring ${ringTeeth} teeth${held ? HELD_WORDS[held] : ''}`;
  return (
    <svg
      className={clsx('planetary', className)}
      viewBox={`0 0 ${SIZE} ${SIZE}`}
      role="img"
      aria-label={label}
    >
      <defs>
        <pattern id={hatch} width="6" height="6" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <rect width="6" height="6" fill="var(--sheet)" />
          <path d="M0 0V6" stroke="currentColor" strokeWidth="1.6" />
        </pattern>
      </defs>
      <circle className="g-ring" style={fill('ring')} cx={CENTRE} cy={CENTRE} r={twoDecimals(outerRadius)} />
      <path
        className="g-void"
        d={gearPath({ cx: CENTRE, cy: CENTRE, teeth: ringTeeth, module, rotation: ringTurn, internal: true })}
      />
      {angles.map((angle, index) => {
        const [cx, cy] = polar(CENTRE, CENTRE, armRadius, angle);
        const d = gearPath({ cx, cy, teeth: planet, module, rotation: planetTurn(angle) });
        return <path key={index} className="g-planet" d={d} />;
      })}
      <path
        className="g-sun"
        style={fill('sun')}
        d={gearPath({ cx: CENTRE, cy: CENTRE, teeth: sunTeeth, module })}
      />
      <path className="g-arm-edge" d={arms} strokeWidth={module * 5 + 2.6} />
      <path
        className="g-arm"
        style={held === 'carrier' ? { stroke: `url(#${hatch})` } : {}}
        d={arms}
        strokeWidth={module * 5}
      />
      {pins.map(([x, y], index) => (
        <circle key={index} className="g-pin" cx={twoDecimals(x)} cy={twoDecimals(y)} r={module * 1.5} />
      ))}
      <circle className="g-hub" cx={CENTRE} cy={CENTRE} r={module * sunTeeth * 0.27} />
      <circle className="g-bore" cx={CENTRE} cy={CENTRE} r={module * sunTeeth * 0.17} />
      <path
        className="g-axis"
        d={`M${CENTRE - outerRadius - 6} ${CENTRE}H${CENTRE + outerRadius + 6}M${CENTRE} ${CENTRE - outerRadius - 6}V${CENTRE + outerRadius + 6}`}
      />
    </svg>
  );
}
