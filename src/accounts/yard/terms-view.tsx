// A seller's terms: a form for its owner, words for everybody else who works there.
import { useQuery } from '@tanstack/react-query';
import type { SellerTerms } from '../../../shared/accounts/seller-contract';
import { formatCents } from '../../../shared/kernel/money';
import { DataTable, type Column } from '../../ui/data-table';
import { FourStates } from '../../ui/four-states';
import { Section } from '../../ui/sheet';
import { termsQuery } from '../api';
import { TermsForm } from './terms-form';

type Line = SellerTerms['schedule'][number];

const COLUMNS: readonly Column<Line>[] = [
  { head: 'Fault', phone: 'name', cell: (line) => line.label },
  { head: 'Takes off', number: true, phone: 'amount', cell: (line) => formatCents(line.cents) },
];

function TermsWords({ terms }: { readonly terms: SellerTerms }) {
  const payer = terms.returnFreight === 'seller' ? 'We pay' : 'The builder pays';
  return (
    <div className="grid max-w-read gap-14">
      {terms.depositCents === null ? (
        <p>Outright only: buyers keep their old unit.</p>
      ) : (
        <p>
          Core deposit <b className="b money">{formatCents(terms.depositCents)}</b>, return window{' '}
          {terms.windowDays} days. {payer} the core&rsquo;s way back.
          {terms.outright ? ' Outright too.' : ''}
        </p>
      )}
      <p>
        Ship within {terms.shipDays} business days; {terms.graceDays} days after that the sale is undone.
      </p>
      {terms.depositCents !== null && (
        <Section title="Deductions">
          <DataTable
            caption="Deductions"
            columns={COLUMNS}
            rows={terms.schedule}
            rowKey={(line) => line.code}
          />
        </Section>
      )}
      <p className="sm mute">Only an owner of the account changes the terms.</p>
    </div>
  );
}

export function TermsView({ sellerId, isOwner }: { readonly sellerId: string; readonly isOwner: boolean }) {
  const query = useQuery(termsQuery(sellerId));
  return (
    <FourStates query={query} waiting="Reading the terms">
      {(terms) => (isOwner ? <TermsForm sellerId={sellerId} terms={terms} /> : <TermsWords terms={terms} />)}
    </FourStates>
  );
}
