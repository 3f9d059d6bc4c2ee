// Where this account is signed in, and a way to end each of them from here.
import { useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import type { listSessions } from '../../../shared/accounts/contract';
import { Button } from '../../ui/button';
import { DataTable, type Column } from '../../ui/data-table';
import { Flag } from '../../ui/flag';
import { FourStates } from '../../ui/four-states';
import { When } from '../../ui/when';
import { sessionsQuery, useEndSession } from '../api';
import { browserWords } from './browser-words';

type Session = z.output<NonNullable<typeof listSessions.answer>>['items'][number];

export function SessionList() {
  const query = useQuery(sessionsQuery);
  const end = useEndSession();
  const columns: readonly Column<Session>[] = [
    { head: 'Browser', phone: 'name', cell: (session) => browserWords(session.agent) },
    {
      head: 'Signed in',
      phone: 'labelled',
      cell: (session) => (session.startedAt ? <When at={session.startedAt} show="day-time" /> : 'Not known'),
    },
    {
      head: 'Ends at the latest',
      phone: 'labelled',
      cell: (session) => <When at={session.endsAt} show="day-time" />,
    },
    {
      head: 'Sign out',
      headHidden: true,
      cell: (session) =>
        session.current ? (
          <Flag tone="fits">This one</Flag>
        ) : (
          <Button
            size="small"
            busy={end.isPending && end.variables === session.id}
            busyWords="Signing out"
            onClick={() => end.mutate(session.id)}
          >
            Sign out there
          </Button>
        ),
    },
  ];
  return (
    <FourStates query={query} waiting="Reading the sessions">
      {(data) => (
        <DataTable
          caption="Where you are signed in"
          columns={columns}
          rows={data.items}
          rowKey={(session) => session.id}
        />
      )}
    </FourStates>
  );
}
