// Solids of revolution drawn in the exploded view: circles seen from the side become ellipses squashed to 0.30.
import { around, closed, twoDecimals as n, type Point } from './geometry';

/** How flat a circle looks in this view. */
const SQUASH = 0.3;

const radians = (degrees: number) => (degrees * Math.PI) / 180;

export interface RoundProps {
  /** Along the shaft. */
  readonly x: number;
  readonly r: number;
  /** `o` is a filled outline, `d` a detail line. */
  readonly line?: 'o' | 'd';
}

export function Round({ x, r, line = 'o' }: RoundProps) {
  return <ellipse className={line} cx={n(x)} cy="0" rx={n(r * SQUASH)} ry={n(r)} />;
}

interface BarrelProps {
  readonly from: number;
  readonly to: number;
  readonly r: number;
  /** Radius at the far end; the same when left out. */
  readonly r2?: number;
}

/** A cylinder or cone with its near face. */
export function Barrel({ from, to, r, r2 = r }: BarrelProps) {
  const far = `L${n(to)} ${n(-r2)}A${n(r2 * SQUASH)} ${n(r2)} 0 0 1 ${n(to)} ${n(r2)}`;
  const near = `L${n(from)} ${n(r)}A${n(r * SQUASH)} ${n(r)} 0 0 0 ${n(from)} ${n(-r)}Z`;
  return (
    <>
      <path className="o" d={`M${n(from)} ${n(-r)}${far}${near}`} />
      <Round x={from} r={r} />
    </>
  );
}

/** Ribs or splines along a barrel, at angles in degrees. */
export function Ribs({ from, to, r, r2, at }: Required<BarrelProps> & { readonly at: readonly number[] }) {
  const d = at.map((degrees) => {
    const angle = radians(degrees);
    const [x0, x1] = [from + r * Math.cos(angle) * SQUASH, to + r2 * Math.cos(angle) * SQUASH];
    return `M${n(x0)} ${n(r * Math.sin(angle))}L${n(x1)} ${n(r2 * Math.sin(angle))}`;
  });
  return <path className="d" d={d.join('')} />;
}

/** The visible half of a ring round a barrel. */
export function Band({ x, r }: { readonly x: number; readonly r: number }) {
  return <path className="d" d={`M${n(x)} ${n(-r)}A${n(r * SQUASH)} ${n(r)} 0 0 1 ${n(x)} ${n(r)}`} />;
}

interface HolesProps {
  readonly x: number;
  readonly r: number;
  readonly count: number;
  readonly hole: number;
  readonly offset?: number;
}

export function Holes({ x, r, count, hole, offset = 0 }: HolesProps) {
  return around(count, offset).map((angle) => (
    <ellipse
      key={angle}
      className="d"
      cx={n(x + r * SQUASH * Math.cos(angle))}
      cy={n(r * Math.sin(angle))}
      rx={n(hole * SQUASH * 1.5)}
      ry={n(hole)}
    />
  ));
}

interface FlangeProps {
  readonly x: number;
  readonly radiusAt: (angle: number) => number;
  /** Teeth need more steps than ears. */
  readonly steps?: number;
  readonly line?: 'o' | 'd';
}

/** An outline that isn't round: a flange with ears, a plate with teeth. */
export function Flange({ x, radiusAt, steps = 480, line = 'o' }: FlangeProps) {
  const points = around(steps).map((angle): Point => {
    const r = radiusAt(angle);
    return [x + r * SQUASH * Math.cos(angle), r * Math.sin(angle)];
  });
  return <path className={line} d={closed(points)} />;
}

/** Where something bolted to a face sits, seen in this view. */
export const onFace = (r: number, angle: number): string =>
  `translate(${n(r * SQUASH * Math.cos(angle))} ${n(r * Math.sin(angle))})`;
