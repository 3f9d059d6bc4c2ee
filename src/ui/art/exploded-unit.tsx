// An automatic taken apart along its shaft, with the eight joints numbered as everywhere else in the product.
import { Drawing } from './drawing';
import { Bellhousing, Case, Converter, Pan } from './exploded-front';
import { ClutchPack, Drum, OutputShaft, PlanetCarrier, RingGear, TailHousing, Yoke } from './exploded-rear';

/** Where each number stands and what it points at: [number, x, y, target x, target y]. */
const JOINTS = [
  [1, 44, -116, 44, -78],
  [2, 172, -178, 172, -152],
  [3, 300, 176, 404, 32],
  [4, 600, 150, 448, 52],
  [5, 1112, 118, 1112, 66],
  [6, 1000, -84, 1000, -15],
  [7, 1058, -120, 1058, -77],
  [8, 1204, -84, 1204, -40],
] as const;

/** The case code's pad, as a share of the drawing's width, so that a code plate can be hung above it. */
export const CODE_PAD_LEFT = '34.9%';

function Balloons() {
  return (
    <>
      <path className="lead-line" d="M441-44V-170" />
      <circle className="dot" cx="441" cy="-44" r="2.6" />
      {JOINTS.map(([number, x, y, toX, toY]) => (
        <g key={number}>
          <path className="lead-line" d={`M${x} ${y}L${toX} ${toY}`} />
          <circle className="dot" cx={toX} cy={toY} r="2.6" />
          <g className="balloon">
            <circle cx={x} cy={y} r="13" />
            <text x={x} y={y + 4.6}>
              {number}
            </text>
          </g>
        </g>
      ))}
    </>
  );
}

/** Drawn from right to left, so that each part covers the one behind it. */
export function ExplodedUnit({
  balloons = true,
  className,
}: {
  readonly balloons?: boolean;
  readonly className?: string;
}) {
  return (
    <Drawing
      viewBox="-20 -200 1320 440"
      label="Exploded line drawing of an automatic transmission with its eight joints numbered"
      {...(className ? { className } : {})}
    >
      <path className="a" d="M-6 0H1310" />
      <Yoke />
      <TailHousing />
      <OutputShaft />
      <RingGear />
      <PlanetCarrier />
      <ClutchPack />
      <Drum />
      <Case />
      <Bellhousing />
      <Converter />
      <Pan />
      {balloons && <Balloons />}
    </Drawing>
  );
}
