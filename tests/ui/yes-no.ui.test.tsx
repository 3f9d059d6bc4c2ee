// @vitest-environment happy-dom
import { screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it } from 'vitest';
import { YesNo, type YesNoAnswer } from '../../src/ui/form/yes-no';
import { render } from './render';

function Check({ costs }: { readonly costs?: number }) {
  const [answer, setAnswer] = useState<YesNoAnswer | null>(null);
  return <YesNo legend="Pan on" value={answer} onChange={setAnswer} noCostsCents={costs} />;
}

describe('yes or no', () => {
  it('when nothing is answered, then neither is chosen', () => {
    render(<Check />);
    expect(screen.getByRole('group', { name: 'Pan on' })).toBeInTheDocument();
    for (const radio of screen.getAllByRole('radio')) expect(radio).not.toBeChecked();
  });

  it('when no is pressed, then it alone is chosen', async () => {
    render(<Check />);
    await userEvent.click(screen.getByRole('radio', { name: 'Yes' }));
    await userEvent.click(screen.getByRole('radio', { name: 'No' }));
    expect(screen.getByRole('radio', { name: 'No' })).toBeChecked();
    expect(screen.getByRole('radio', { name: 'Yes' })).not.toBeChecked();
  });

  it('when a no takes money off, then it says how much with a true minus sign', () => {
    render(<Check costs={4_000} />);
    expect(screen.getByRole('radio', { name: /^No/ })).toHaveAccessibleName('No −$40.00');
  });
});
