// The order of the list. Without a ZIP code nothing can be measured, so the nearest can't come first.
import type { Sort } from '../../../shared/listings/card';
import { RadioGroup } from '../../ui/form/radio-group';
import { Select } from '../../ui/form/select';
import type { UnitQuery } from './search-url';

interface SortProps {
  readonly query: UnitQuery;
  readonly onAsk: (query: UnitQuery) => void;
}

const SORTS: readonly { readonly value: Sort; readonly label: string }[] = [
  { value: 'best', label: 'Best match' },
  { value: 'price', label: 'Least to pay today' },
  { value: 'distance', label: 'Nearest yard' },
  { value: 'newest', label: 'Newest first' },
];

const offered = (query: UnitQuery) => SORTS.filter((one) => one.value !== 'distance' || query.zip);

const sorted = (query: UnitQuery, value: string): UnitQuery => ({
  ...query,
  sort: SORTS.find((one) => one.value === value)?.value,
});

export function SortSelect({ query, onAsk }: SortProps) {
  return (
    <div className="sort-select">
      <Select
        label="Sort"
        options={offered(query)}
        value={query.sort ?? 'best'}
        onChange={(event) => onAsk(sorted(query, event.target.value))}
      />
    </div>
  );
}

export function SortChoice({ query, onAsk }: SortProps) {
  return (
    <RadioGroup
      legend="First comes"
      options={offered(query)}
      value={query.sort ?? 'best'}
      onChange={(event) => onAsk(sorted(query, event.target.value))}
    />
  );
}
