// @vitest-environment happy-dom
import { screen, within } from '@testing-library/react';
import { describe, expect, it } from 'vitest';
import { finishedPath, racePoints } from '../../src/ui/race-geometry';
import { TwoLegRace, type LegStep } from '../../src/ui/two-leg-race';
import { render } from './render';

const OUT: readonly LegStep[] = [
  { key: 'pay', label: 'Paid', when: 'Mon 16 Feb', money: '$2,359.03 in', state: 'proved' },
  { key: 'accept', label: 'Checked', when: 'Tue 24 Feb', state: 'proved' },
];
const BACK: readonly LegStep[] = [
  { key: 'book', label: 'Tag and book', when: 'Now', state: 'now' },
  { key: 'grade', label: 'Graded', when: 'within 5 days', state: 'todo' },
];
const SUMS = [{ label: 'Deposit', cents: 60_000, where: 'Held for you', state: 'held' as const }];

const race = (back: readonly LegStep[] | null) => (
  <TwoLegRace
    out={OUT}
    back={back}
    shop={{ place: 'Your shop', label: 'Swapped', when: 'Sat 14 Mar', state: 'proved' }}
    yard="Quenby"
    sums={SUMS}
  />
);

const words = (list: HTMLElement) =>
  within(list)
    .getAllByRole('listitem')
    .map((item) => item.textContent);

describe('the race of an order', () => {
  it('when a reader hears it, then it is two ordered lists with every step, its state, date and money', () => {
    render(race(BACK));
    expect(words(screen.getByRole('list', { name: 'Unit out' }))).toEqual([
      'Paid, done. Mon 16 Feb · $2,359.03 in',
      'Checked, done. Tue 24 Feb',
      'Swapped, your shop, done. Sat 14 Mar',
    ]);
    expect(words(screen.getByRole('list', { name: 'Core back' }))).toEqual([
      'Tag and book, now. Now',
      'Graded, not yet. within 5 days',
    ]);
  });

  it('when a step is the live one, then it alone is marked as the current step', () => {
    render(race(BACK));
    const live = screen
      .getAllByRole('listitem')
      .filter((item) => item.getAttribute('aria-current') === 'step');
    expect(live.map((item) => item.textContent)).toEqual(['Tag and book, now. Now']);
  });

  it('when the picture is drawn, then a reader does not hear it a second time', () => {
    render(race(BACK));
    for (const twice of screen.getAllByText('Tag and book')) {
      const drawn = twice.closest('[aria-hidden="true"]') !== null;
      const listed = twice.closest('ol') !== null;
      expect(drawn).not.toBe(listed);
    }
  });

  it('when nothing comes back, then there is one leg and no turn', () => {
    render(race(null));
    expect(words(screen.getByRole('list', { name: 'Unit out' }))).toHaveLength(2);
    expect(screen.queryByRole('list', { name: 'Core back' })).not.toBeInTheDocument();
  });

  it('when money is held, then the sums are listed with who holds them', () => {
    render(race(BACK));
    expect(screen.getByRole('definition')).toHaveTextContent('$600.00 Held for you');
  });
});

describe('the finished part of the race', () => {
  const path = (out: LegStep['state'][], shop: LegStep['state'], back: LegStep['state'][]) => {
    const points = racePoints(out, shop, back);
    return finishedPath([...points.out, points.shop, ...points.back]);
  };

  it('when nothing is proved, then none of the channel is finished', () => {
    expect(path(['now', 'todo'], 'todo', ['todo'])).toBeNull();
  });

  it('when the live step is on the way out, then the channel ends there', () => {
    expect(path(['proved', 'now'], 'todo', ['todo', 'todo'])).toBe('M33 231A112 112 0 0 1 145 119H738');
  });

  it('when the live step is on the way back, then the channel runs round the turn to it', () => {
    expect(path(['proved', 'proved'], 'proved', ['now', 'todo'])).toMatch(
      /847 231A112 112 0 0 1 735 343H722$/,
    );
  });

  it('when the last step is proved, then the race is closed', () => {
    expect(path(['proved', 'proved'], 'proved', ['proved', 'proved'])).toMatch(/H145A112 112 0 0 1 33 231$/);
  });
});
