// The filters beside the list, each value with how many units it would leave.
import { KIND_WORDS, UNIT_KINDS } from '../../../shared/catalogue/kinds';
import { COUNT_CAP, type Facets } from '../../../shared/listings/card';
import { GRADES } from '../../../shared/listings/condition';
import { Checkbox } from '../../ui/form/checkbox';
import { GRADE_WORDS, STATE_WORDS, TERMS_WORDS } from '../unit-words';
import { NearField } from './near-field';
import { PriceCap } from './price-cap';
import { toggled, type ListKey, type UnitQuery } from './search-url';

interface FacetPanelProps {
  readonly query: UnitQuery;
  readonly facets: Facets | undefined;
  readonly onAsk: (query: UnitQuery) => void;
}

interface Choice {
  readonly value: string;
  readonly label: string;
}

type FacetKey = keyof Facets & ListKey;

interface GroupProps extends FacetPanelProps {
  readonly legend: string;
  readonly facet: FacetKey;
  readonly choices: readonly Choice[];
}

/** A count at the cap means "at least". */
const countWords = (count: number): string => (count >= COUNT_CAP ? `${COUNT_CAP}+` : String(count));

function Group({ legend, facet, choices, query, facets, onAsk }: GroupProps) {
  const chosen: readonly string[] = query[facet] ?? [];
  const counts = new Map(facets?.[facet].map((one) => [one.value, one.count]));
  const shown = choices.filter((one) => !facets || counts.has(one.value) || chosen.includes(one.value));
  if (shown.length === 0) return null;
  return (
    <fieldset className="facet">
      <legend>{legend}</legend>
      {shown.map((one) => (
        <Checkbox
          key={one.value}
          label={
            <>
              {one.label}
              {facets && <span className="facet-count num">{countWords(counts.get(one.value) ?? 0)}</span>}
            </>
          }
          checked={chosen.includes(one.value)}
          onChange={() => onAsk(toggled(query, facet, one.value))}
        />
      ))}
    </fieldset>
  );
}

const KINDS = UNIT_KINDS.map((kind) => ({ value: kind, label: KIND_WORDS[kind].many }));
const GRADE_CHOICES = GRADES.map((grade) => ({ value: grade, label: GRADE_WORDS[grade] }));
const TERMS = Object.entries(TERMS_WORDS).map(([value, label]) => ({ value, label }));
const STATES = Object.entries(STATE_WORDS).map(([value, label]) => ({ value, label }));

/** The families that the answer names; a chosen one that it doesn't name stays to be unticked. */
function families({ query, facets }: FacetPanelProps): Choice[] {
  const named = facets?.familyId.map((one) => ({ value: one.value, label: one.label ?? one.value })) ?? [];
  const missing = (query.familyId ?? []).filter((id) => !named.some((one) => one.value === id));
  return [...named, ...missing.map((id) => ({ value: id, label: 'The family you chose' }))];
}

export function FacetPanel(props: FacetPanelProps) {
  const { query, onAsk } = props;
  return (
    <div className="facets">
      <Group {...props} legend="Kind of unit" facet="kind" choices={KINDS} />
      <Group {...props} legend="Yard’s core grade" facet="grade" choices={GRADE_CHOICES} />
      <Group {...props} legend="How you buy" facet="terms" choices={TERMS} />
      <PriceCap query={query} onAsk={onAsk} />
      <NearField query={query} onAsk={onAsk} />
      <Group {...props} legend="Where it is now" facet="state" choices={STATES} />
      <Group {...props} legend="Family" facet="familyId" choices={families(props)} />
    </div>
  );
}
