// The newest of a yard's stock on its Today page: tag, unit, code, grade, price and state.
import { useQuery, queryOptions } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { formatTag } from '../../../shared/kernel/tag-code';
import { listStock, type StockItem } from '../../../shared/listings/contract';
import { call } from '../../http/client';
import { paths } from '../../paths';
import { ButtonLink } from '../../ui/button';
import { CodePlate } from '../../ui/code-plate';
import { DataTable, type Column } from '../../ui/data-table';
import { EmptyState } from '../../ui/empty-state';
import { Flag, type FlagTone } from '../../ui/flag';
import { FourStates } from '../../ui/four-states';
import { GradeSquare } from '../../ui/grade-square';
import { Money } from '../../ui/money';
import { Section, Sheet } from '../../ui/sheet';

const SHOWN = 6;

const stockQuery = (sellerId: string) =>
  queryOptions({
    queryKey: ['orders', 'stock', sellerId],
    queryFn: ({ signal }) => call(listStock, { query: { sellerId, limit: SHOWN }, signal }),
  });

function stateOf(item: StockItem): { readonly tone: FlagTone; readonly words: string } {
  switch (item.status) {
    case 'live':
      return { tone: 'fits', words: 'On sale' };
    case 'reserved':
      return { tone: 'held', words: 'On hold' };
    case 'sold':
      return { tone: 'plain', words: 'Sold' };
    case 'withdrawn':
      return { tone: 'plain', words: 'Off sale' };
    case 'draft':
      return item.missing.length > 0
        ? { tone: 'stop', words: `${item.missing.length} to do` }
        : { tone: 'plain', words: 'Ready to list' };
  }
}

const money = (cents: number | null) => (cents === null ? '' : <Money cents={cents} />);

const COLUMNS: readonly Column<StockItem>[] = [
  {
    head: 'Photo',
    headHidden: true,
    phone: 'hidden',
    cell: (item) => item.photoUrl && <img src={item.photoUrl} alt="" width="60" height="45" loading="lazy" />,
  },
  {
    head: 'Tag',
    phone: 'hidden',
    cell: (item) => <span className="code sm">{formatTag(item.tagCode)}</span>,
  },
  {
    head: 'Unit',
    phone: 'name',
    cell: (item) => (
      <Link className="link" to={paths.yardListing.to({ id: item.id })}>
        {item.title}
      </Link>
    ),
  },
  {
    head: 'Case code',
    cell: (item) => item.caseCode && <CodePlate groups={[item.caseCode]} size="small" />,
  },
  { head: 'Grade', cell: (item) => item.grade && <GradeSquare grade={item.grade} size="small" /> },
  { head: 'Exchange', number: true, phone: 'amount', cell: (item) => money(item.priceCents) },
  { head: 'Deposit', number: true, phone: 'hidden', cell: (item) => money(item.depositCents) },
  {
    head: 'State',
    cell: (item) => {
      const { tone, words } = stateOf(item);
      return <Flag tone={tone}>{words}</Flag>;
    },
  },
];

export function StockSummary({ sellerId }: { readonly sellerId: string }) {
  const query = useQuery(stockQuery(sellerId));
  return (
    <Section
      title="Stock"
      note={
        <Link className="link" to={paths.yardStock.to()}>
          All of it
        </Link>
      }
    >
      <FourStates
        query={query}
        waiting="Reading the stock"
        isEmpty={(data) => data.items.length === 0}
        empty={
          <EmptyState
            title="Nothing on the rack yet"
            actions={
              <ButtonLink size="big" to={paths.newListing.to()}>
                List a unit
              </ButtonLink>
            }
          />
        }
      >
        {(data) => (
          <Sheet>
            <DataTable
              caption="Newest stock"
              columns={COLUMNS}
              rows={data.items}
              rowKey={(item) => item.id}
            />
          </Sheet>
        )}
      </FourStates>
    </Section>
  );
}
