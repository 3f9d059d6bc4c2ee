// @vitest-environment happy-dom
import { useQuery } from '@tanstack/react-query';
import { screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { ProblemError } from '../../src/http/client';
import { FourStates } from '../../src/ui/four-states';
import { render } from './render';

type Load = () => Promise<readonly string[]>;

function Stock({ load }: { readonly load: Load }) {
  const query = useQuery({ queryKey: ['stock'], queryFn: load });
  return (
    <>
      <FourStates
        query={query}
        waiting="Reading the stock"
        isEmpty={(units) => units.length === 0}
        empty={<p>No units yet</p>}
      >
        {(units) => units.map((unit) => <p key={unit}>{unit}</p>)}
      </FourStates>
      <button type="button" onClick={() => void query.refetch()}>
        Read again
      </button>
    </>
  );
}

const down = () =>
  new ProblemError({
    type: 'about:blank#unavailable',
    title: 'A service we need does not answer',
    status: 503,
    detail: 'Storage is down.',
    requestId: 'req-77',
  });

describe('four states', () => {
  it('when the answer is on its way, then words say what is read', () => {
    render(<Stock load={() => new Promise(() => undefined)} />);
    expect(screen.getByRole('status')).toHaveTextContent('Reading the stock');
  });

  it('when there is something, then it is drawn and nothing else', async () => {
    render(<Stock load={async () => ['Keld 66A']} />);
    expect(await screen.findByText('Keld 66A')).toBeInTheDocument();
    expect(screen.queryByRole('status')).not.toBeInTheDocument();
    expect(screen.queryByText('No units yet')).not.toBeInTheDocument();
  });

  it('when there is nothing, then the empty state is drawn', async () => {
    render(<Stock load={async () => []} />);
    expect(await screen.findByText('No units yet')).toBeInTheDocument();
  });

  it('when it fails, then the server’s words and the request’s number are shown, and trying again works', async () => {
    const load = vi.fn<Load>().mockRejectedValueOnce(down()).mockResolvedValue(['Keld 66A']);
    render(<Stock load={load} />);
    const alert = await screen.findByRole('alert');
    expect(alert).toHaveTextContent('A service we need does not answer');
    expect(alert).toHaveTextContent('Storage is down.');
    expect(alert).toHaveTextContent('req-77');
    await userEvent.click(screen.getByRole('button', { name: 'Try again' }));
    expect(await screen.findByText('Keld 66A')).toBeInTheDocument();
    expect(screen.queryByRole('alert')).not.toBeInTheDocument();
  });

  it('when an error is not the server’s, then its text is not shown', async () => {
    render(<Stock load={() => Promise.reject(new Error('connect ECONNREFUSED 10.0.0.7:5432'))} />);
    expect(await screen.findByRole('alert')).not.toHaveTextContent('ECONNREFUSED');
  });

  it('when reading again fails, then what is known stays and is called out of date', async () => {
    const load = vi.fn<Load>().mockResolvedValueOnce(['Keld 66A']).mockRejectedValue(down());
    render(<Stock load={load} />);
    await screen.findByText('Keld 66A');
    await userEvent.click(screen.getByRole('button', { name: 'Read again' }));
    expect(await screen.findByRole('status')).toHaveTextContent('This may be out of date. Storage is down.');
    expect(screen.getByText('Keld 66A')).toBeInTheDocument();
  });
});
