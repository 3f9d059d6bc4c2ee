// @vitest-environment happy-dom
import { screen, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { z } from 'zod';
import { OfflineError, ProblemError } from '../../src/http/client';
import { Form, useZodForm } from '../../src/ui/form/form';
import { MoneyField } from '../../src/ui/form/money-field';
import { TextInput } from '../../src/ui/form/text-input';
import { render } from './render';

const schema = z.object({
  title: z.string().min(1, 'Type something here'),
  terms: z.object({ depositCents: z.number('Type a deposit, such as 600.00') }),
});

type Values = z.output<typeof schema>;

function Listing({ save }: { readonly save: (values: Values) => Promise<void> }) {
  const form = useZodForm(schema, { title: '' });
  return (
    <Form form={form} stops="this listing" onSubmit={save}>
      <TextInput label="Unit name" error={form.formState.errors.title?.message} {...form.register('title')} />
      <MoneyField control={form.control} name="terms.depositCents" label="Core deposit" />
      <button type="submit">Save</button>
    </Form>
  );
}

const refused = (errors: { path: string; message: string }[]) =>
  new ProblemError({
    type: 'about:blank#invalid',
    title: 'Check what you entered',
    status: 422,
    detail: 'Some fields',
    errors,
  });

async function fillAndSave() {
  await userEvent.type(screen.getByLabelText('Unit name'), 'Keld 66A');
  await userEvent.type(screen.getByLabelText('Core deposit'), '600');
  await userEvent.click(screen.getByRole('button', { name: 'Save' }));
}

describe('form', () => {
  it('when two fields are wrong, then a summary counts them, takes focus and names each field', async () => {
    const save = vi.fn();
    render(<Listing save={save} />);
    await userEvent.click(screen.getByRole('button', { name: 'Save' }));
    const summary = await screen.findByRole('alert');
    expect(summary).toHaveFocus();
    expect(summary).toHaveTextContent('Two things stop this listing');
    expect(
      within(summary)
        .getAllByRole('link')
        .map((link) => link.textContent),
    ).toEqual(['Unit name: Type something here', 'Core deposit: Type a deposit, such as 600.00']);
    expect(save).not.toHaveBeenCalled();
  });

  it('when a line of the summary is followed, then its field has focus', async () => {
    render(<Listing save={vi.fn()} />);
    await userEvent.click(screen.getByRole('button', { name: 'Save' }));
    await userEvent.click(await screen.findByRole('link', { name: /Core deposit/ }));
    expect(screen.getByLabelText('Core deposit')).toHaveFocus();
  });

  it('when the same faults stay at a second try, then the summary takes focus again', async () => {
    render(<Listing save={vi.fn()} />);
    await userEvent.click(screen.getByRole('button', { name: 'Save' }));
    await screen.findByRole('alert');
    await userEvent.click(screen.getByRole('button', { name: 'Save' }));
    await vi.waitFor(() => expect(screen.getByRole('alert')).toHaveFocus());
  });

  it('when the server names a field, then its message stands at that field, nested ones too', async () => {
    const save = vi
      .fn()
      .mockRejectedValue(refused([{ path: 'terms.depositCents', message: 'Make it less than the price' }]));
    render(<Listing save={save} />);
    await fillAndSave();
    expect(await screen.findByRole('alert')).toHaveTextContent('One thing stops this listing');
    expect(screen.getByLabelText('Core deposit')).toHaveAccessibleDescription('Make it less than the price');
    expect(save).toHaveBeenCalledWith({ title: 'Keld 66A', terms: { depositCents: 60_000 } });
  });

  it('when the server names something the form has no field for, then it is still said', async () => {
    render(
      <Listing
        save={vi.fn().mockRejectedValue(refused([{ path: 'photos.bell', message: 'Shoot the bell face' }]))}
      />,
    );
    await fillAndSave();
    expect(await screen.findByRole('alert')).toHaveTextContent('Shoot the bell face');
  });

  it('when nothing answers, then the form says so and keeps what was typed', async () => {
    render(<Listing save={vi.fn().mockRejectedValue(new OfflineError())} />);
    await fillAndSave();
    expect(await screen.findByRole('alert')).toHaveTextContent('No answer');
    expect(screen.getByLabelText('Unit name')).toHaveValue('Keld 66A');
  });

  it('when the second try succeeds, then the refusal of the first is gone', async () => {
    const save = vi.fn().mockRejectedValueOnce(new OfflineError()).mockResolvedValue(undefined);
    render(<Listing save={save} />);
    await fillAndSave();
    await screen.findByRole('alert');
    await userEvent.click(screen.getByRole('button', { name: 'Save' }));
    await vi.waitFor(() => expect(screen.queryByRole('alert')).not.toBeInTheDocument());
    expect(save).toHaveBeenCalledTimes(2);
  });
});
