// @vitest-environment happy-dom
import { screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { MoneyInput } from '../../src/ui/form/money-input';
import { render } from './render';

function Held({
  start,
  onCents,
}: {
  readonly start: number | null;
  readonly onCents: (cents: number | null) => void;
}) {
  const [cents, setCents] = useState(start);
  return (
    <>
      <MoneyInput
        label="Exchange price"
        value={cents}
        onChange={(next) => {
          setCents(next);
          onCents(next);
        }}
      />
      <button type="button" onClick={() => setCents(99_999)}>
        From elsewhere
      </button>
    </>
  );
}

const field = () => screen.getByLabelText('Exchange price');

describe('money input', () => {
  it.each([
    ['1450', 145_000],
    ['1,450.5', 145_050],
    ['$1,450.00', 145_000],
    ['0.07', 7],
  ])('when a person types %s, then the form gets %s cents', async (typed, cents) => {
    const onCents = vi.fn();
    render(<Held start={null} onCents={onCents} />);
    await userEvent.type(field(), typed);
    expect(onCents).toHaveBeenLastCalledWith(cents);
  });

  it('when the field is left, then the amount stands with two decimals', async () => {
    render(<Held start={null} onCents={() => undefined} />);
    await userEvent.type(field(), '1450.5');
    expect(field()).toHaveValue('1450.5');
    await userEvent.tab();
    expect(field()).toHaveValue('1,450.50');
  });

  it('when the words are no amount, then they stay, nothing is taken, and the field says what to type', async () => {
    const onCents = vi.fn();
    render(<Held start={145_000} onCents={onCents} />);
    await userEvent.clear(field());
    await userEvent.type(field(), '12.345');
    expect(onCents).toHaveBeenLastCalledWith(null);
    await userEvent.tab();
    expect(field()).toHaveValue('12.345');
    expect(field()).toBeInvalid();
    expect(field()).toHaveAccessibleDescription('Type an amount, such as 1450.00');
  });

  it('when the value changes from elsewhere, then it replaces words that were no amount', async () => {
    render(<Held start={null} onCents={() => undefined} />);
    await userEvent.type(field(), 'abc');
    await userEvent.click(screen.getByRole('button'));
    expect(field()).toHaveValue('999.99');
    expect(field()).toBeValid();
  });
});
