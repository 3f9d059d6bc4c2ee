// What a shot should show: the line drawings of empty shot tiles and of the camera's overlay.
import type { ReactNode } from 'react';
import { AutomaticParts } from './automatic-side';
import { Drawing } from './drawing';
import { around, ears, outline, polar, splineBore, twoDecimals } from './geometry';

export type ShotGuideName =
  'left' | 'right' | 'bell' | 'output' | 'pan' | 'plug' | 'code' | 'fluid' | 'damage' | 'input';

const CX = 120;
const CY = 90;

function Holes({ at, r }: { readonly at: readonly (readonly [number, number])[]; readonly r: number }) {
  return at.map(([x, y]) => (
    <circle key={`${x} ${y}`} className="d" cx={twoDecimals(x)} cy={twoDecimals(y)} r={r} />
  ));
}

function Rings({ radii }: { readonly radii: readonly number[] }) {
  return radii.map((radius) => <circle key={radius} className="o" cx={CX} cy={CY} r={radius} />);
}

const onCircle = (count: number, radius: number, offset = 0) =>
  around(count, offset).map((angle) => polar(CX, CY, radius, angle));

const PAN_BOLTS = [
  [60, 47],
  [94, 47],
  [128, 47],
  [162, 47],
  [188, 66],
  [189, 96],
  [187, 126],
  [164, 139],
  [128, 139],
  [92, 139],
  [62, 139],
  [51, 118],
  [51, 90],
  [51, 62],
] as const;

const STAMPED = Array.from({ length: 9 }, (_, index) => 42 + index * 18);

const GUIDES: Readonly<Record<ShotGuideName, ReactNode>> = {
  left: (
    <g transform="translate(6 36) scale(.36)">
      <AutomaticParts />
    </g>
  ),
  right: (
    <g transform="translate(234 36) scale(-.36 .36)">
      <AutomaticParts />
    </g>
  ),
  bell: (
    <>
      <path className="o" d={outline(CX, CY, ears(78, 9, 10, 0.35, 0.11))} />
      <Holes at={onCircle(9, 82, 0.35)} r={3} />
      <Rings radii={[68, 42, 15]} />
      <circle className="d" cx={CX} cy={CY} r="8" />
    </>
  ),
  output: (
    <>
      <path className="o" d={outline(CX, CY, ears(62, 6, 11, 0.5, 0.16))} />
      <Holes at={onCircle(6, 65, 0.5)} r={4} />
      <Rings radii={[44, 32]} />
      <path className="o" d={splineBore(CX, CY, 32, 22, 18)} />
      <path className="o" d="M78 148h84v18H78z" />
    </>
  ),
  pan: (
    <>
      <path className="o" d="M50 40H186L196 54V132L178 146H58L44 132V52Z" />
      <path className="o" d="M62 54H176L182 62V124L170 132H66L58 124V62Z" />
      <Holes at={PAN_BOLTS} r={3.4} />
      <circle className="o" cx="92" cy="96" r="9" />
    </>
  ),
  plug: (
    <>
      <Rings radii={[58, 48]} />
      <Holes at={[...onCircle(5, 16), ...onCircle(11, 34)]} r={4} />
      <path className="o" d="M112 32V22h16v10" />
    </>
  ),
  code: (
    <>
      <path className="o" d="M22 52H218V128H22Z" />
      <path className="d" d="M32 62H208V118H32Z" />
      {STAMPED.map((x) => (
        <path key={x} className="o" d={`M${x} 78h11v24h-11z`} />
      ))}
    </>
  ),
  fluid: (
    <>
      <path className="o" d="M52 30L188 24 200 148 44 156Z" />
      <path className="d" d="M64 42L178 36M60 144L190 138" />
      <path className="o" d="M120 54C138 82 146 94 146 106A26 26 0 0 1 94 106C94 94 102 82 120 54Z" />
    </>
  ),
  damage: (
    <>
      <path className="o" d="M40 150V60L78 26H200V150Z" />
      <circle className="o" cx="120" cy="72" r="46" />
      <path className="o" d="M120 26L112 52 130 70 116 92 128 112" />
      <path className="d" d="M154 104L186 138" />
    </>
  ),
  input: (
    <>
      <path className="o" d="M30 74h96v32H30z" />
      <path className="d" d="M30 82h60M30 90h60M30 98h60" />
      <path className="o" d="M126 44h16v92h-16zM142 20h24v140h-24z" />
    </>
  ),
};

/** Decoration: the tile's own label names the shot. */
export function ShotGuide({
  name,
  className,
}: {
  readonly name: ShotGuideName;
  readonly className?: string;
}) {
  return (
    <Drawing viewBox="0 0 240 180" label={null} {...(className ? { className } : {})}>
      {GUIDES[name]}
    </Drawing>
  );
}
