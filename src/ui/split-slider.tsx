// Splits a held sum between two sides, to the cent: a bar with a sprag on it, two linked fields, nudges, and the sum in words.
import { useRef, type KeyboardEvent, type PointerEvent } from 'react';
import { formatCents, type Cents } from '../../shared/kernel/money';
import { SPRAG_PATH, TIPPED_DEGREES } from './art/sprag';
import { cssVars } from './css-vars';
import { MoneyInput } from './form/money-input';
import { SplitFlags, type SplitFlag } from './split-flags';

export type { SplitFlag } from './split-flags';

interface SplitSliderProps {
  readonly totalCents: Cents;
  /** What the left side gets; the right side gets the rest, always. */
  readonly leftCents: Cents;
  readonly onChange: (leftCents: Cents) => void;
  /** "Back to Abara" */
  readonly leftLabel: string;
  /** "To Quenby" */
  readonly rightLabel: string;
  /** What each side asks (above) and what the terms give (below). */
  readonly flags?: readonly SplitFlag[];
  readonly disabled?: boolean;
}

const CENT = 1;
const DOLLAR = 100;

/** How far each key moves the split; Home and End give it all to one side. */
const KEYS: Readonly<Record<string, number>> = {
  ArrowRight: CENT,
  ArrowUp: CENT,
  ArrowLeft: -CENT,
  ArrowDown: -CENT,
  PageUp: DOLLAR,
  PageDown: -DOLLAR,
  Home: -Infinity,
  End: Infinity,
};

const NUDGES = [
  { label: '−$1', name: 'One dollar less', by: -DOLLAR },
  { label: '−1¢', name: 'One cent less', by: -CENT },
  { label: '+1¢', name: 'One cent more', by: CENT },
  { label: '+$1', name: 'One dollar more', by: DOLLAR },
];

export function SplitSlider(props: SplitSliderProps) {
  const { totalCents, leftCents, onChange, leftLabel, rightLabel, flags = [], disabled = false } = props;
  const bar = useRef<HTMLDivElement>(null);
  const rightCents = totalCents - leftCents;
  const share = totalCents === 0 ? 0 : leftCents / totalCents;

  const set = (cents: number) => {
    if (!disabled) onChange(Math.min(totalCents, Math.max(0, Math.round(cents))));
  };
  function onKeyDown(event: KeyboardEvent) {
    const by = KEYS[event.key];
    if (by === undefined) return;
    event.preventDefault();
    set(leftCents + by);
  }
  /** A finger is coarse: it places whole dollars, and the keys and fields place the cents. */
  function drag(event: PointerEvent) {
    const box = bar.current?.getBoundingClientRect();
    if (!box || (event.type === 'pointermove' && event.buttons === 0)) return;
    const dollars = Math.round((((event.clientX - box.left) / box.width) * totalCents) / DOLLAR);
    set(dollars * DOLLAR);
  }
  return (
    <div className="split">
      <div
        className="split-track"
        style={cssVars({ '--split': `${share * 100}%` })}
        onPointerDown={(event) => {
          event.currentTarget.setPointerCapture(event.pointerId);
          drag(event);
        }}
        onPointerMove={drag}
      >
        <SplitFlags flags={flags} totalCents={totalCents} place="above" />
        <div className="split-bar" ref={bar}>
          <div
            className="split-thumb"
            role="slider"
            tabIndex={disabled ? -1 : 0}
            aria-label={leftLabel}
            aria-disabled={disabled || undefined}
            aria-valuemin={0}
            aria-valuemax={totalCents}
            aria-valuenow={leftCents}
            aria-valuetext={`${leftLabel} ${formatCents(leftCents)}, ${rightLabel.toLowerCase()} ${formatCents(rightCents)}`}
            onKeyDown={onKeyDown}
          >
            <svg viewBox="-16 -16 32 32" aria-hidden="true">
              <path transform={`rotate(${TIPPED_DEGREES})`} d={SPRAG_PATH} />
            </svg>
          </div>
        </div>
        <SplitFlags flags={flags} totalCents={totalCents} place="below" />
      </div>
      <div className="split-fields">
        <MoneyInput
          label={leftLabel}
          value={leftCents}
          onChange={(cents) => cents !== null && set(cents)}
          big
          disabled={disabled}
        />
        <MoneyInput
          label={rightLabel}
          value={rightCents}
          onChange={(cents) => cents !== null && set(totalCents - cents)}
          big
          disabled={disabled}
        />
      </div>
      <div className="split-nudges" role="group" aria-label={`Nudge ${leftLabel.toLowerCase()}`}>
        {NUDGES.map((nudge) => (
          <button
            key={nudge.label}
            type="button"
            aria-label={nudge.name}
            disabled={disabled}
            onClick={() => set(leftCents + nudge.by)}
          >
            {nudge.label}
          </button>
        ))}
      </div>
      <p className="split-sum" role="status">
        {formatCents(leftCents)} + {formatCents(rightCents)} = <b className="b">{formatCents(totalCents)}</b>,
        every cent placed
      </p>
    </div>
  );
}
