// @vitest-environment happy-dom
import { screen } from '@testing-library/react';
import { fireEvent } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import fc from 'fast-check';
import { useState } from 'react';
import { describe, expect, it } from 'vitest';
import { parseDollars } from '../../shared/kernel/money';
import { SplitSlider } from '../../src/ui/split-slider';
import { render } from './render';

function Split({ total = 60_000, start = 46_750 }: { readonly total?: number; readonly start?: number }) {
  const [left, setLeft] = useState(start);
  return (
    <SplitSlider
      totalCents={total}
      leftCents={left}
      onChange={setLeft}
      leftLabel="Back to Abara"
      rightLabel="To Quenby"
    />
  );
}

const slider = () => screen.getByRole('slider', { name: 'Back to Abara' });
const field = (label: string) => screen.getByLabelText(label, { selector: 'input' });
const sum = () => screen.getByRole('status').textContent ?? '';

/** The two amounts the page says it would move. */
function amounts(): [number, number] {
  const [left = '', right = ''] = /^(\S+) \+ (\S+) =/.exec(sum())?.slice(1) ?? [];
  return [parseDollars(left) ?? NaN, parseDollars(right) ?? NaN];
}

describe('split slider', () => {
  it.each([
    ['{ArrowRight}', 46_751],
    ['{ArrowUp}', 46_751],
    ['{ArrowLeft}', 46_749],
    ['{ArrowDown}', 46_749],
    ['{PageUp}', 46_850],
    ['{PageDown}', 46_650],
    ['{Home}', 0],
    ['{End}', 60_000],
  ])('when %s is pressed, then the left side gets %s cents', async (key, cents) => {
    render(<Split />);
    slider().focus();
    await userEvent.keyboard(key);
    expect(slider()).toHaveAttribute('aria-valuenow', String(cents));
    expect(amounts()).toEqual([cents, 60_000 - cents]);
  });

  it('when it moves, then both sums are said', async () => {
    render(<Split />);
    slider().focus();
    await userEvent.keyboard('{PageUp}');
    expect(slider()).toHaveAttribute('aria-valuetext', 'Back to Abara $468.50, to quenby $131.50');
    expect(sum()).toBe('$468.50 + $131.50 = $600.00, every cent placed');
  });

  it('when one field is typed, then the other takes the rest', async () => {
    render(<Split />);
    const right = field('To Quenby');
    await userEvent.clear(right);
    await userEvent.type(right, '92.5');
    await userEvent.tab();
    expect(field('Back to Abara')).toHaveValue('507.50');
    expect(amounts()).toEqual([50_750, 9_250]);
  });

  it('when more than all is typed, then the left side gets all and no more', async () => {
    render(<Split />);
    const left = field('Back to Abara');
    await userEvent.clear(left);
    await userEvent.type(left, '900');
    await userEvent.tab();
    expect(left).toHaveValue('600.00');
    expect(amounts()).toEqual([60_000, 0]);
  });

  it('when any keys, nudges and fields are used in any order, then the two sides always add up to the whole', () => {
    const keys = ['ArrowRight', 'ArrowLeft', 'PageUp', 'PageDown', 'Home', 'End'];
    const nudges = ['One dollar less', 'One cent less', 'One cent more', 'One dollar more'];
    const step = fc.oneof(
      fc.constantFrom(...keys).map((key) => () => fireEvent.keyDown(slider(), { key })),
      fc.constantFrom(...nudges).map((name) => () => fireEvent.click(screen.getByRole('button', { name }))),
      fc.tuple(fc.constantFrom('Back to Abara', 'To Quenby'), fc.integer({ min: 0, max: 99_999 })).map(
        ([label, cents]) =>
          () =>
            fireEvent.change(field(label), {
              target: { value: (cents / 100).toFixed(2) },
            }),
      ),
    );
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 80_000 }), fc.array(step, { maxLength: 12 }), (total, steps) => {
        const { unmount } = render(<Split total={total} start={Math.floor(total / 3)} />);
        try {
          for (const act of steps) {
            act();
            const [left, right] = amounts();
            expect(left + right).toBe(total);
            expect(Math.min(left, right)).toBeGreaterThanOrEqual(0);
          }
        } finally {
          unmount();
        }
      }),
      { numRuns: 40 },
    );
  });
});
