// The rear half of the exploded unit: drum, clutch pack, planetary, output shaft, tail housing, yoke.
import { Band, Barrel, Flange, Holes, onFace, Ribs, Round } from './exploded-shapes';
import { around, ears, toothed } from './geometry';

export function Drum() {
  return (
    <>
      <Barrel from={588} to={636} r={66} />
      <Band x={596} r={66} />
      <Band x={628} r={66} />
      <Ribs from={598} to={628} r={66} r2={66} at={[-75, -60, -45, -30, -15, 0, 15, 30, 45, 60, 75]} />
      <Round x={588} r={60} line="d" />
      <Round x={588} r={30} />
      <Round x={588} r={22} line="d" />
      <Round x={588} r={10} line="d" />
    </>
  );
}

/** Eight plates, drawn from the back: steels with ears outside, friction plates with teeth inside. */
export function ClutchPack() {
  return [7, 6, 5, 4, 3, 2, 1, 0].map((index) => {
    const x = 672 + index * 13;
    return index % 2 === 1 ? (
      <g key={index}>
        <Flange x={x} radiusAt={ears(58, 8, 5, 0.2, 0.16)} />
        <Round x={x} r={44} />
      </g>
    ) : (
      <g key={index}>
        <Round x={x} r={58} />
        <Flange x={x} radiusAt={toothed(30, 40, 4)} />
      </g>
    );
  });
}

export function PlanetCarrier() {
  return (
    <>
      <Barrel from={800} to={822} r={46} />
      <Round x={800} r={40} line="d" />
      {around(4, 0.5).map((angle) => (
        <g key={angle} transform={onFace(27, angle)}>
          <Flange x={800} radiusAt={toothed(14, 11, 3)} steps={280} />
          <Round x={800} r={4} line="d" />
        </g>
      ))}
      <Flange x={800} radiusAt={toothed(18, 13, 3)} steps={360} />
      <Round x={800} r={7} line="d" />
    </>
  );
}

export function RingGear() {
  return (
    <>
      <Barrel from={846} to={884} r={62} />
      <Band x={852} r={62} />
      <Band x={878} r={62} />
      <Round x={846} r={54} line="d" />
      <Flange x={846} radiusAt={toothed(40, 48, 5)} steps={640} line="d" />
    </>
  );
}

export function OutputShaft() {
  return (
    <>
      <Barrel from={905} to={1030} r={15} />
      <Ribs from={985} to={1030} r={15} r2={15} at={[-70, -50, -30, -10, 10, 30, 50, 70]} />
      <Barrel from={898} to={906} r={30} />
      <Round x={898} r={20} line="d" />
    </>
  );
}

export function TailHousing() {
  return (
    <>
      <Barrel from={1075} to={1150} r={56} r2={40} />
      <Ribs from={1083} to={1150} r={58} r2={41} at={[-50, -18, 18, 50]} />
      <path className="o" d="M1088 50H1138V66H1088Z" />
      <path className="d" d="M1100 50v16M1126 50v16" />
      <Flange x={1066} radiusAt={ears(64, 6, 9, 0.5, 0.22)} />
      <Flange x={1058} radiusAt={ears(64, 6, 9, 0.5, 0.22)} />
      <Holes x={1058} r={67} count={6} hole={4} offset={0.5} />
      <Round x={1058} r={50} line="d" />
      <Round x={1058} r={34} />
      <Round x={1058} r={26} line="d" />
    </>
  );
}

export function Yoke() {
  return (
    <>
      <Barrel from={1195} to={1212} r={40} />
      <Ribs from={1195} to={1212} r={40} r2={40} at={[-60, -30, 0, 30, 60]} />
      <Round x={1195} r={26} line="d" />
      <Round x={1195} r={14} line="d" />
      <path
        className="o"
        d="M1214-36L1254-44C1268-42 1270-26 1258-20L1224-14M1214 36L1254 44C1268 42 1270 26 1258 20L1224 14"
      />
      <ellipse className="d" cx="1254" cy="-32" rx="4" ry="8" />
      <ellipse className="d" cx="1254" cy="32" rx="4" ry="8" />
    </>
  );
}
