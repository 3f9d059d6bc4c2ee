// A drive axle from behind: two flanges, tubes, and the round cover with its bolts.
import { Drawing, type DrawingProps } from './drawing';
import { polar, twoDecimals } from './geometry';

const COVER_BOLTS = Array.from({ length: 12 }, (_, index) =>
  polar(340, 140, 74, (index * Math.PI) / 6 + 0.26),
);

export function AxleRear(props: DrawingProps) {
  return (
    <Drawing viewBox="0 0 640 280" label="Rear view of an axle" {...props}>
      <path className="a" d="M0 140H640M340 30V250" />
      <path className="o" d="M6 118h20v44H6z" />
      <path className="o" d="M26 84h12v112H26z" />
      <path className="d" d="M26 100h12M26 180h12" />
      <path className="o" d="M38 122H250V158H38Z" />
      <path className="d" d="M38 130H250" />
      <path className="o" d="M92 112h64v10H92zM92 158h64v8H92z" />
      <path className="d" d="M124 112v10" />
      <path className="o" d="M614 118h20v44h-20z" />
      <path className="o" d="M602 84h12v112h-12z" />
      <path className="d" d="M602 100h12M602 180h12" />
      <path className="o" d="M430 122H602V158H430Z" />
      <path className="d" d="M430 130H602" />
      <path className="o" d="M496 112h64v10h-64zM496 158h64v8h-64z" />
      <path className="d" d="M528 112v10" />
      <path className="o" d="M232 116H262V164H232ZM418 116H448V164H418Z" />
      <circle className="o" cx="340" cy="140" r="88" />
      <circle className="o" cx="340" cy="140" r="80" />
      <path
        className="o"
        d="M340 78C384 78 402 108 402 140 402 172 384 202 340 202 300 202 284 176 284 140 284 104 300 78 340 78Z"
      />
      <path
        className="d"
        d="M340 90C376 90 390 114 390 140 390 166 376 190 340 190 308 190 296 168 296 140 296 112 308 90 340 90Z"
      />
      <circle className="o" cx="318" cy="148" r="9" />
      <path className="d" d="M314 148h8M318 144v8" />
      {COVER_BOLTS.map(([x, y]) => (
        <circle key={`${x} ${y}`} className="d" cx={twoDecimals(x)} cy={twoDecimals(y)} r="4.2" />
      ))}
      <path className="o" d="M172 104h16v14h-16z" />
      <path className="d" d="M180 104V96" />
    </Drawing>
  );
}
