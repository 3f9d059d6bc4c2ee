// The families of the catalogue, narrowed while a person types; the address holds kind and words.
import { useQuery } from '@tanstack/react-query';
import { useDeferredValue, useMemo } from 'react';
import { Link } from 'react-router-dom';
import type { FamilySummary } from '../../shared/catalogue/contract';
import { KIND_WORDS, UNIT_KINDS, type UnitKind } from '../../shared/catalogue/kinds';
import { paths } from '../paths';
import { AutomaticSide } from '../ui/art/automatic-side';
import { Button, ButtonLink } from '../ui/button';
import { DataTable, type Column } from '../ui/data-table';
import { EmptyState } from '../ui/empty-state';
import { FourStates } from '../ui/four-states';
import { TextInput } from '../ui/form/text-input';
import { Sheet } from '../ui/sheet';
import { familiesQuery } from './api';
import { CONTROL_WORDS, ratiosLine, unitWords } from './family-words';
import { KindFilter } from './kind-filter';
import { makeSuggester } from './suggest';

const COLUMNS: readonly Column<FamilySummary>[] = [
  {
    head: 'Unit',
    phone: 'name',
    cell: (family) => (
      <Link className="link catalogue-name" to={paths.family.to({ id: family.id })}>
        {family.name}
      </Link>
    ),
  },
  { head: 'What it is', cell: unitWords },
  { head: 'Ratios', cell: (family) => <span className="num catalogue-ratios">{ratiosLine(family)}</span> },
  { head: 'Control', phone: 'hidden', cell: (family) => CONTROL_WORDS[family.control] },
  { head: 'Weight', number: true, phone: 'amount', cell: (family) => `${family.dryWeightLb} lb` },
  {
    head: 'Model years',
    number: true,
    phone: 'labelled',
    cell: (family) => (family.years ? `${family.years.from} to ${family.years.to}` : 'Not known'),
  },
  { head: 'Variants', number: true, phone: 'labelled', cell: (family) => String(family.variantCount) },
];

export interface FamilyFilter {
  readonly kind: UnitKind | null;
  readonly words: string;
}

interface FamilyListProps {
  readonly filter: FamilyFilter;
  readonly onFilter: (filter: FamilyFilter) => void;
}

const countByKind = (families: readonly FamilySummary[]): Readonly<Record<UnitKind, number>> => ({
  automatic: families.filter((family) => family.kind === 'automatic').length,
  manual: families.filter((family) => family.kind === 'manual').length,
  transfer_case: families.filter((family) => family.kind === 'transfer_case').length,
  axle: families.filter((family) => family.kind === 'axle').length,
});

function NothingFound({ filter, onFilter }: FamilyListProps) {
  return (
    <EmptyState
      title={`No unit called “${filter.words}”${filter.kind ? ` among the ${KIND_WORDS[filter.kind].many.toLowerCase()}` : ''}`}
      drawing={<AutomaticSide thin label={null} />}
      actions={
        <>
          <ButtonLink look="go" size="big" to={paths.codeReader.to()}>
            Check a code instead
          </ButtonLink>
          <Button size="big" onClick={() => onFilter({ kind: null, words: '' })}>
            Show every unit
          </Button>
        </>
      }
    >
      <p>The name on a parts list is often the vehicle’s. What is stamped on the case tells more.</p>
    </EmptyState>
  );
}

function Found({ families, filter, onFilter }: FamilyListProps & { families: readonly FamilySummary[] }) {
  const suggest = useMemo(() => makeSuggester(families), [families]);
  const words = useDeferredValue(filter.words);
  const named = suggest(words);
  const shown = named.filter((family) => filter.kind === null || family.kind === filter.kind);
  return (
    <>
      <KindFilter
        kind={filter.kind}
        counts={countByKind(named)}
        total={named.length}
        onChange={(kind) => onFilter({ ...filter, kind })}
      />
      <p className="vh" role="status">
        {shown.length} of {families.length} units
      </p>
      {shown.length === 0 ? (
        <NothingFound filter={filter} onFilter={onFilter} />
      ) : (
        <Sheet>
          <DataTable
            caption="Families of units"
            columns={COLUMNS}
            rows={shown}
            rowKey={(family) => family.id}
          />
        </Sheet>
      )}
    </>
  );
}

export function FamilyList({ filter, onFilter }: FamilyListProps) {
  const query = useQuery(familiesQuery());
  return (
    <div className="grid gap-18">
      <TextInput
        label="Maker or unit"
        hint={`Such as Keld 66A, or ${UNIT_KINDS.map((kind) => KIND_WORDS[kind].one).join(', ')}`}
        type="search"
        name="catalogue-words"
        autoComplete="off"
        value={filter.words}
        onChange={(event) => onFilter({ ...filter, words: event.target.value })}
      />
      <FourStates query={query} waiting="Opening the code book">
        {(families) => <Found families={families} filter={filter} onFilter={onFilter} />}
      </FourStates>
    </div>
  );
}
