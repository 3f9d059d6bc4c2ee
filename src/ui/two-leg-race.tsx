// An order as one picture: a closed race on a desk, one vertical race on a phone, and an ordered list to a reader.
import clsx from 'clsx';
import { ArrowDown } from 'lucide-react';
import { useId } from 'react';
import { Sprag, STEP_WORDS } from './art/sprag';
import { Icon } from './icon';
import { Money } from './money';
import { RaceLoop } from './race-loop';
import { RaceStraight } from './race-straight';
import type { LegStep, RaceShop, RaceSum } from './race-steps';

export type { LegStep, RaceShop, RaceSum } from './race-steps';

interface TwoLegRaceProps {
  /** The unit going to the builder, in order. */
  readonly out: readonly LegStep[];
  /** The core coming back, in order; null when nothing comes back. */
  readonly back: readonly LegStep[] | null;
  readonly shop: RaceShop;
  /** The yard's name. */
  readonly yard: string;
  /** Up to three; the held one stands in a red chamber, so give it the middle place. */
  readonly sums: readonly RaceSum[];
}

function ListStep({ step }: { readonly step: LegStep }) {
  return (
    <li
      className={clsx('race-row', `race-row-${step.state}`)}
      aria-current={step.state === 'now' ? 'step' : undefined}
    >
      <span className="race-row-mark">
        <Sprag state={step.state} size={step.state === 'now' ? 40 : 32} />
      </span>
      <span className="race-row-words">
        <b>{step.label}</b>
        <span className="vh">, {STEP_WORDS[step.state]}. </span>
        {step.when && <span className={step.state === 'now' ? 'held' : 'mute'}>{step.when}</span>}
        {step.when && step.money && <span aria-hidden="true"> · </span>}
        {step.money && <span className="ok num">{step.money}</span>}
      </span>
    </li>
  );
}

function Leg({ title, steps }: { readonly title: string; readonly steps: readonly LegStep[] }) {
  const id = useId();
  return (
    <>
      <p className="race-leg" id={id}>
        {title} <Icon of={ArrowDown} />
      </p>
      <ol aria-labelledby={id}>
        {steps.map((step) => (
          <ListStep key={step.key} step={step} />
        ))}
      </ol>
    </>
  );
}

export function TwoLegRace({ out, back, shop, yard, sums }: TwoLegRaceProps) {
  const turn: LegStep = {
    key: 'shop',
    label: `${shop.label}, ${shop.place.toLowerCase()}`,
    ...(shop.when ? { when: shop.when } : {}),
    state: shop.state,
  };
  return (
    <div className="race-box">
      {back ? (
        <RaceLoop out={out} back={back} shop={shop} yard={yard} sums={sums} />
      ) : (
        <RaceStraight out={out} shop={shop} yard={yard} sums={sums} />
      )}
      <div className="race-list">
        <Leg title="Unit out" steps={back ? [...out, turn] : out} />
        {back && <Leg title="Core back" steps={back} />}
        <dl className="race-list-sums">
          {sums.map((sum) => (
            <div key={sum.label}>
              <dt>{sum.label}</dt>
              <dd>
                <Money cents={sum.cents} />{' '}
                <span className={sum.state === 'held' ? 'held' : 'ok'}>{sum.where}</span>
              </dd>
            </div>
          ))}
        </dl>
      </div>
    </div>
  );
}
