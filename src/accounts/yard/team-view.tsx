// Who works for a seller account, what each may do, and who was invited; only an owner changes it.
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Team } from '../../../shared/accounts/seller-contract';
import { Button } from '../../ui/button';
import { DataTable, type Column } from '../../ui/data-table';
import { ConfirmDialog } from '../../ui/dialog';
import { FourStates } from '../../ui/four-states';
import { Section } from '../../ui/sheet';
import { When } from '../../ui/when';
import { teamQuery, useTeamChanges } from '../api';
import { DUTY_WORDS } from '../words';
import { DutiesDialog } from './duties-dialog';
import { InviteForm } from './invite-form';

type Member = Team['members'][number];
type Invite = Team['invites'][number];

const dutyWords = (duties: Member['duties']): string =>
  duties.map((duty) => DUTY_WORDS[duty].name).join(', ');

interface TeamViewProps {
  readonly sellerId: string;
  readonly sellerName: string;
  readonly isOwner: boolean;
}

function Members({ sellerId, sellerName, isOwner, members }: TeamViewProps & { readonly members: Member[] }) {
  const [changing, setChanging] = useState<Member | null>(null);
  const [removing, setRemoving] = useState<Member | null>(null);
  const { remove } = useTeamChanges(sellerId);
  const columns: Column<Member>[] = [
    {
      head: 'Member',
      phone: 'name',
      cell: (member) => (
        <>
          {member.name}
          <span className="sm mute block wrap-anywhere">{member.email}</span>
        </>
      ),
    },
    { head: 'Duties', phone: 'labelled', cell: (member) => dutyWords(member.duties) },
    { head: 'Since', phone: 'labelled', cell: (member) => <When at={member.since} /> },
  ];
  if (isOwner) {
    columns.push({
      head: 'Change',
      headHidden: true,
      cell: (member) => (
        <div className="flex flex-wrap gap-8">
          <Button size="small" aria-label={`Duties of ${member.name}`} onClick={() => setChanging(member)}>
            Duties
          </Button>
          <Button size="small" aria-label={`Remove ${member.name}`} onClick={() => setRemoving(member)}>
            Remove
          </Button>
        </div>
      ),
    });
  }
  return (
    <>
      <DataTable caption="Team" columns={columns} rows={members} rowKey={(member) => member.userId} />
      {changing && <DutiesDialog sellerId={sellerId} member={changing} onClose={() => setChanging(null)} />}
      {removing && (
        <ConfirmDialog
          open
          onClose={() => setRemoving(null)}
          title={`Remove ${removing.name}?`}
          description={`${removing.name} sees nothing of ${sellerName} any more, at once. You can invite them again.`}
          confirmWords={`Remove ${removing.name}`}
          onConfirm={async () => {
            await remove.mutateAsync(removing.userId);
          }}
        />
      )}
    </>
  );
}

function Invites({ sellerId, invites }: { readonly sellerId: string; readonly invites: Invite[] }) {
  const { cancel } = useTeamChanges(sellerId);
  const columns: readonly Column<Invite>[] = [
    { head: 'Invited', phone: 'name', cell: (one) => <span className="wrap-anywhere">{one.email}</span> },
    { head: 'Duties', phone: 'labelled', cell: (one) => dutyWords(one.duties) },
    {
      head: 'Link works until',
      phone: 'labelled',
      cell: (one) => <When at={one.expiresAt} show="day-time" />,
    },
    {
      head: 'Take back',
      headHidden: true,
      cell: (one) => (
        <Button
          size="small"
          aria-label={`Take back the invitation to ${one.email}`}
          busy={cancel.isPending && cancel.variables === one.id}
          busyWords="Taking it back"
          onClick={() => cancel.mutate(one.id)}
        >
          Take back
        </Button>
      ),
    },
  ];
  return (
    <Section title="Invited, not here yet">
      <DataTable caption="Open invitations" columns={columns} rows={invites} rowKey={(one) => one.id} />
    </Section>
  );
}

export function TeamView(props: TeamViewProps) {
  const { sellerId, isOwner } = props;
  const query = useQuery(teamQuery(sellerId));
  return (
    <FourStates query={query} waiting="Reading the team">
      {(team) => (
        <>
          <Members {...props} members={team.members} />
          {isOwner && team.invites.length > 0 && <Invites sellerId={sellerId} invites={team.invites} />}
          {isOwner && (
            <Section title="Invite somebody">
              <div className="max-w-read">
                <InviteForm sellerId={sellerId} />
              </div>
            </Section>
          )}
        </>
      )}
    </FourStates>
  );
}
