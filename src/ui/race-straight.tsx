// The race of an order without a core to send back: one channel from the yard to the shop.
import { Sprag } from './art/sprag';
import { RaceSumBlock } from './race-loop';
import type { LegStep, RaceShop, RaceSum } from './race-steps';

interface RaceStraightProps {
  readonly out: readonly LegStep[];
  readonly shop: RaceShop;
  readonly yard: string;
  readonly sums: readonly RaceSum[];
}

const percent = (value: number) => `${value * 100}%`;

/** Decoration to a reader: the same steps stand in the ordered list beside it. */
export function RaceStraight({ out, shop, yard, sums }: RaceStraightProps) {
  const reached = out.filter((step) => step.state !== 'todo').length;
  const provedAll = out.at(-1)?.state === 'proved';
  const anyProved = out.some((step) => step.state === 'proved');
  const finished = provedAll ? 1 : anyProved ? (reached - 0.5) / out.length : 0;
  return (
    <div className="race-straight" aria-hidden="true">
      <div className="race-straight-words">
        {out.map((step) => (
          <div key={step.key} className={`race-step race-step-${step.state}`}>
            <b>{step.label}</b>
            {step.when && <span>{step.when}</span>}
            {step.money && <span className="ok num">{step.money}</span>}
          </div>
        ))}
      </div>
      <div className="race-channel">
        <div className="race-channel-finished" style={{ width: percent(finished) }} />
        {out.map((step) => (
          <span key={step.key} className={`race-${step.state}`}>
            <Sprag state={step.state} size={step.state === 'now' ? 46 : 36} />
          </span>
        ))}
      </div>
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
    </div>
  );
}
