// @vitest-environment happy-dom
import { screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { ConfirmDialog } from '../../src/ui/dialog';
import { Notices, sayStop } from '../../src/ui/notices';
import { act } from '@testing-library/react';
import { render } from './render';

function Ask({ onConfirm }: { readonly onConfirm: () => Promise<void> }) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <button type="button" onClick={() => setOpen(true)}>
        Grade it
      </button>
      <ConfirmDialog
        open={open}
        onClose={() => setOpen(false)}
        title="Release $530.00?"
        description="Once it is released it cannot be called back."
        confirmWords="Release $530.00"
        onConfirm={onConfirm}
      />
    </>
  );
}

const opened = async (onConfirm: () => Promise<void>) => {
  render(<Ask onConfirm={onConfirm} />);
  await userEvent.click(screen.getByRole('button', { name: 'Grade it' }));
  return screen.getByRole('alertdialog', { name: 'Release $530.00?' });
};

describe('confirm dialog', () => {
  it('when it opens, then it says what happens, and no style element is put into the page', async () => {
    const before = document.querySelectorAll('style').length;
    const dialog = await opened(vi.fn());
    expect(dialog).toHaveAccessibleDescription('Once it is released it cannot be called back.');
    expect(document.querySelectorAll('style')).toHaveLength(before);
  });

  it('when it is left, then nothing was done and the button has focus again', async () => {
    const onConfirm = vi.fn();
    await opened(onConfirm);
    await userEvent.keyboard('{Escape}');
    expect(screen.queryByRole('alertdialog')).not.toBeInTheDocument();
    expect(onConfirm).not.toHaveBeenCalled();
    await vi.waitFor(() => expect(screen.getByRole('button', { name: 'Grade it' })).toHaveFocus());
  });

  it('when it is confirmed twice in a hurry, then it is done once', async () => {
    let finish = () => {};
    const onConfirm = vi.fn(() => new Promise<void>((resolve) => (finish = resolve)));
    await opened(onConfirm);
    await userEvent.click(screen.getByRole('button', { name: 'Release $530.00' }));
    await userEvent.click(screen.getByRole('button', { name: 'Working' }));
    expect(onConfirm).toHaveBeenCalledTimes(1);
    await act(async () => finish());
    await vi.waitFor(() => expect(screen.queryByRole('alertdialog')).not.toBeInTheDocument());
  });
});

describe('notices', () => {
  it('when something stops, then it is said and can be closed', async () => {
    render(<Notices />);
    act(() => sayStop('Not sent. No signal'));
    expect(await screen.findByText('Not sent. No signal', { selector: '.notice div' })).toBeInTheDocument();
    await userEvent.click(screen.getByRole('button', { name: 'Close notice' }));
    expect(screen.queryByText('Not sent. No signal', { selector: '.notice div' })).not.toBeInTheDocument();
  });
});
