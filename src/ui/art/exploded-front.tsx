// The front half of the exploded unit: converter, bellhousing, case, pan.
import { Band, Barrel, Flange, Holes, onFace, Ribs, Round } from './exploded-shapes';
import { around, ears, twoDecimals } from './geometry';

const range = (count: number) => Array.from({ length: count }, (_, index) => index);

export function Converter() {
  return (
    <>
      <path className="o" d="M44-78L92-94C112-88 118-40 118 0S112 88 92 94L44 78Z" />
      <path className="d" d="M66-86C82-70 90-34 90 0S82 70 66 86" />
      <Round x={44} r={78} />
      <Round x={44} r={66} line="d" />
      <Round x={44} r={26} />
      <Round x={44} r={16} line="d" />
      {around(4, 0.6).map((angle) => (
        <g key={angle} transform={onFace(72, angle)}>
          <Round x={44} r={6} />
        </g>
      ))}
      <Barrel from={118} to={142} r={14} />
      <Round x={118} r={14} line="d" />
    </>
  );
}

export function Bellhousing() {
  return (
    <>
      <Barrel from={196} to={292} r={132} r2={98} />
      <Ribs from={212} to={288} r={132} r2={100} at={[-66, -44, -22, 0, 22, 44, 66]} />
      <Flange x={184} radiusAt={ears(137, 9, 11, 0.35, 0.15)} steps={600} />
      <Flange x={172} radiusAt={ears(137, 9, 11, 0.35, 0.15)} steps={600} />
      <Holes x={172} r={141} count={9} hole={4.6} offset={0.35} />
      <Round x={172} r={122} line="d" />
      <Round x={172} r={92} />
      <Round x={172} r={84} line="d" />
      <Round x={172} r={40} />
      <Round x={172} r={28} line="d" />
    </>
  );
}

function CaseFittings() {
  return (
    <>
      <path className="o" d="M404-44H478V-14H404Z" />
      <path className="d" d="M410-38H472V-20H410Z" />
      {range(7).map((index) => (
        <path key={index} className="d" d={`M${416 + index * 8}-34V-24`} />
      ))}
      <circle className="o" cx="502" cy="18" r="17" />
      <circle className="d" cx="502" cy="18" r="11" />
      <path className="d" d="M494 18H510M502 10V26" />
      <circle className="o" cx="410" cy="24" r="12" />
      <circle className="d" cx="410" cy="24" r="7" />
      <circle className="d" cx="407" cy="22" r="1" />
      <circle className="d" cx="413" cy="22" r="1" />
      <circle className="d" cx="410" cy="28" r="1" />
      <path className="o" d="M446 16h22v10h-22z" />
      <path className="o" d="M452 21L436 58h8L460 23" />
    </>
  );
}

export function Case() {
  return (
    <>
      <Barrel from={330} to={548} r={92} r2={74} />
      <Ribs from={342} to={540} r={92} r2={75} at={[-64, -40, 40, 64]} />
      <Band x={372} r={89} />
      <Band x={520} r={77} />
      <CaseFittings />
      <path className="o" d="M352 78L540 62V76L352 94Z" />
      {range(9).map((index) => (
        <path key={index} className="d" d={`M${360 + index * 21} ${twoDecimals(80 - index * 1.72)}v12`} />
      ))}
      <Flange x={330} radiusAt={ears(95, 8, 9, 0.2, 0.16)} />
      <Round x={330} r={88} line="d" />
      <Round x={330} r={30} line="d" />
      <Round x={330} r={20} line="d" />
      <Holes x={330} r={98} count={8} hole={3.6} offset={0.2} />
    </>
  );
}

const PAN_BOLTS = [364, 444, 528];

export function Pan() {
  return (
    <>
      {PAN_BOLTS.map((x) => (
        <path key={x} className="a" d={`M${x} 84V206`} />
      ))}
      <path className="o" d="M338 150H548L543 160H343Z" />
      <path className="o" d="M350 160H536L522 196H366Z" />
      <path className="d" d="M366 172H526" />
      {range(8).map((index) => (
        <path key={index} className="d" d={`M${352 + index * 26} 150v10`} />
      ))}
      {PAN_BOLTS.map((x) => (
        <path key={x} className="o" d={`M${x - 5} 206h10v5h-10zM${x - 2.5} 211v12h5v-12z`} />
      ))}
    </>
  );
}
