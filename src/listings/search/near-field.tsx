// Where to measure from, and how far a yard may be.
import { useId, useState } from 'react';
import { zip as zipField } from '../../../shared/kernel/fields';
import { Button } from '../../ui/button';
import { ErrorMessage } from '../../ui/form/field';
import { Select } from '../../ui/form/select';
import { TextInput } from '../../ui/form/text-input';
import type { UnitQuery } from './search-url';

interface NearFieldProps {
  readonly query: UnitQuery;
  readonly onAsk: (query: UnitQuery) => void;
}

const DISTANCES = [50, 100, 250, 500, 1000];

const milesOptions = (chosen: number | undefined) =>
  [...new Set([...DISTANCES, ...(chosen === undefined ? [] : [chosen])])]
    .sort((a, b) => a - b)
    .map((miles) => ({ value: String(miles), label: `${miles.toLocaleString('en-US')} miles` }));

function Near({ query, onAsk }: NearFieldProps) {
  const [zip, setZip] = useState(query.zip ?? '');
  const [within, setWithin] = useState(query.withinMiles === undefined ? '' : String(query.withinMiles));
  const [error, setError] = useState('');
  const errorId = useId();
  function set() {
    const given = zip.trim();
    if (given !== '' && !zipField.safeParse(given).success) return setError('Five digits, such as 83702');
    if (given === '' && within !== '') return setError('Type a ZIP code to measure from');
    setError('');
    onAsk({
      ...query,
      zip: given || undefined,
      withinMiles: within && given ? Number(within) : undefined,
      sort: query.sort === 'distance' && !given ? undefined : query.sort,
    });
  }
  return (
    <form
      className="facet"
      aria-label="Distance"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        set();
      }}
    >
      <h3 className="facet-title">Near you</h3>
      <div className="facet-near">
        <TextInput
          label="ZIP code"
          inputMode="numeric"
          autoComplete="postal-code"
          maxLength={5}
          value={zip}
          aria-describedby={error ? errorId : undefined}
          onChange={(event) => setZip(event.target.value)}
        />
        <Select
          label="Within"
          placeholder="Any distance"
          options={milesOptions(query.withinMiles)}
          value={within}
          onChange={(event) => setWithin(event.target.value)}
        />
      </div>
      {error && <ErrorMessage id={errorId}>{error}</ErrorMessage>}
      <Button type="submit" full>
        Measure from there
      </Button>
    </form>
  );
}

export const NearField = (props: NearFieldProps) => (
  <Near key={`${props.query.zip ?? ''} ${props.query.withinMiles ?? ''}`} {...props} />
);
