// The closed race as a picture: the unit goes out along the top, turns at the shop, and the core comes back along the bottom.
import clsx from 'clsx';
import { Money } from './money';
import { SPRAG_PATH } from './art/sprag';
import { finishedPath, LOOP, racePoints, stepShare, turnDegrees, type RacePoint } from './race-geometry';
import type { LegStep, RaceShop, RaceSum } from './race-steps';

interface RaceLoopProps {
  readonly out: readonly LegStep[];
  readonly back: readonly LegStep[];
  readonly shop: RaceShop;
  readonly yard: string;
  readonly sums: readonly RaceSum[];
}

function RaceSprag({ point }: { readonly point: RacePoint }) {
  const scale = point.state === 'now' ? 1.45 : 1.12;
  return (
    <path
      className={`race-sprag race-${point.state}`}
      transform={`translate(${point.x} ${point.y}) rotate(${turnDegrees(point)}) scale(${scale})`}
      d={SPRAG_PATH}
    />
  );
}

const share = (value: number, whole: number) => `${(value / whole) * 100}%`;

function StepWords({
  step,
  point,
  width,
}: {
  readonly step: LegStep;
  readonly point: RacePoint;
  readonly width: number;
}) {
  const place =
    point.leg === 'out' ? { bottom: share(LOOP.height - 84, LOOP.height) } : { top: share(382, LOOP.height) };
  return (
    <div
      className={clsx('race-step', `race-step-${step.state}`)}
      style={{ left: share(point.x, LOOP.width), width: `${width * 100}%`, ...place }}
    >
      <b>{step.label}</b>
      {step.when && <span>{step.when}</span>}
      {step.money && <span className="ok num">{step.money}</span>}
    </div>
  );
}

export function RaceSumBlock({ sum }: { readonly sum: RaceSum }) {
  return (
    <div className={clsx('race-sum', sum.state === 'held' && 'race-sum-held')}>
      <span>{sum.label}</span>
      <Money cents={sum.cents} />
      <span className={sum.state === 'held' ? 'held' : 'ok'}>{sum.where}</span>
    </div>
  );
}

function Arrow({ left = false }: { readonly left?: boolean }) {
  return (
    <svg viewBox="0 0 26 16" width="26" height="16" style={left ? { transform: 'scaleX(-1)' } : undefined}>
      <path d="M1 8H24M17 2L24 8L17 14" fill="none" stroke="currentColor" strokeWidth="2.2" />
    </svg>
  );
}

function Inside({ yard, shop, sums }: Pick<RaceLoopProps, 'yard' | 'shop' | 'sums'>) {
  return (
    <div className="race-inside">
      <p className="race-lane">
        Unit out <Arrow />
      </p>
      <div className="race-ends">
        <span>
          Yard<b>{yard}</b>
        </span>
        <div className="race-sums">
          {sums.map((sum) => (
            <RaceSumBlock key={sum.label} sum={sum} />
          ))}
        </div>
        <span className="r">
          {shop.place}
          <b>{shop.label}</b>
          {shop.when}
        </span>
      </div>
      <p className="race-lane">
        <Arrow left /> Core back
      </p>
    </div>
  );
}

/** Decoration to a reader: the same steps stand in the ordered list beside it. */
export function RaceLoop({ out, back, shop, yard, sums }: RaceLoopProps) {
  const states = (steps: readonly LegStep[]) => steps.map((step) => step.state);
  const points = racePoints(states(out), shop.state, states(back));
  const all = [...points.out, points.shop, ...points.back];
  const finished = finishedPath(all);
  const words = (steps: readonly LegStep[], at: readonly RacePoint[]) =>
    steps.map((step, index) => {
      const point = at[index];
      return point && <StepWords key={step.key} step={step} point={point} width={stepShare(steps.length)} />;
    });
  return (
    <div className="race-loop" aria-hidden="true">
      <svg viewBox={`0 0 ${LOOP.width} ${LOOP.height}`}>
        {finished && <path className="race-finished" d={finished} />}
        <rect className="race-outer" x="10" y="96" width="860" height="270" rx="135" />
        <rect className="race-inner" x="56" y="142" width="768" height="178" rx="89" />
        {all.map((point, index) => (
          <RaceSprag key={index} point={point} />
        ))}
      </svg>
      {words(out, points.out)}
      {words(back, points.back)}
      <Inside yard={yard} shop={shop} sums={sums} />
    </div>
  );
}
