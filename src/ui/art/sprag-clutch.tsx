// A whole sprag clutch seen from the end, for the sign-in page: outer race, a ring of sprags, inner race, splined bore.
import { Drawing } from './drawing';
import { around, polar, splineBore, twoDecimals } from './geometry';
import { SPRAG_PATH } from './sprag';

const SIZE = 520;
const C = SIZE / 2;
const OUTER = C * 0.96;
const CHANNEL_OUTER = C * 0.8;
const CHANNEL_INNER = C * 0.6;
const BORE = C * 0.4;
const MIDDLE = (CHANNEL_OUTER + CHANNEL_INNER) / 2;
const SCALE = (CHANNEL_OUTER - CHANNEL_INNER) / 27.4;
/** The sprags lean this much against the radius. */
const LEAN_DEGREES = 20;

const degrees = (angle: number) => (angle * 180) / Math.PI;

interface SpragClutchProps {
  readonly count?: number;
  /** Which sprag is live, counted from twelve o'clock; none when left out. */
  readonly live?: number;
  readonly className?: string;
}

export function SpragClutch({ count = 26, live, className }: SpragClutchProps) {
  return (
    <Drawing
      viewBox={`-12 -12 ${SIZE + 24} ${SIZE + 24}`}
      label="A sprag clutch seen from the end"
      className={`clutch ${className ?? ''}`}
    >
      <circle className="o" cx={C} cy={C} r={OUTER} />
      <circle className="o" cx={C} cy={C} r={CHANNEL_OUTER} />
      {around(count, -Math.PI / 2).map((angle, index) => {
        const [x, y] = polar(C, C, MIDDLE, angle);
        const turn = twoDecimals(degrees(angle) + 90 + LEAN_DEGREES);
        const place = `translate(${twoDecimals(x)} ${twoDecimals(y)}) rotate(${turn}) scale(${twoDecimals(SCALE)})`;
        return <path key={index} className={index === live ? 'sr' : 'sk'} transform={place} d={SPRAG_PATH} />;
      })}
      <circle className="o" cx={C} cy={C} r={CHANNEL_INNER} />
      <circle className="d" cx={C} cy={C} r={CHANNEL_INNER * 0.93} />
      <path className="o" d={splineBore(C, C, 30, BORE, BORE * 0.9)} />
      <path
        className="a"
        d={`M${C - OUTER - 8} ${C}H${C + OUTER + 8}M${C} ${C - OUTER - 8}V${C + OUTER + 8}`}
      />
      {around(8, Math.PI / 8).map((angle, index) => {
        const [x, y] = polar(C, C, (OUTER + CHANNEL_OUTER) / 2, angle);
        return <circle key={index} className="d" cx={twoDecimals(x)} cy={twoDecimals(y)} r={C * 0.024} />;
      })}
    </Drawing>
  );
}
