// One variant: its years, its codes taken apart, and its joints.
import { PLACE_WORDS, type CodePattern, type Segment } from '../../shared/catalogue/code-pattern';
import { shownJoints, type ShownJoint } from '../../shared/catalogue/joints';
import type { UnitKind } from '../../shared/catalogue/kinds';
import type { Variant } from '../../shared/catalogue/variant';
import { composeCode } from '../../shared/reading/compose-code';
import { CodePlate } from '../ui/code-plate';
import { DataTable } from '../ui/data-table';
import { formatDay } from '../ui/dates';

const RULES: Readonly<Partial<Record<Segment['kind'], string>>> = {
  year_digit: 'Last figure of the year it was built',
  year_two: 'Last two figures of the year it was built',
  day_of_year: 'Day of that year, 001 to 366',
  serial: 'Serial number',
  check: 'Check figure, from all before it',
};

function Meaning({ segment }: { readonly segment: Segment }) {
  const values = Object.entries(segment.values ?? {});
  if (values.length === 0) return RULES[segment.kind] ?? segment.name;
  return (
    <ul className="grid gap-2">
      {values.map(([value, meaning]) => (
        <li key={value}>
          <span className="code">{value}</span> {meaning}
        </li>
      ))}
    </ul>
  );
}

function Pattern({ pattern, variant }: { readonly pattern: CodePattern; readonly variant: Variant }) {
  const example = composeCode(pattern, { builtOn: variant.builtFrom, pick: ([first = '']) => first });
  return (
    <div className="pattern">
      <p className="flex flex-wrap items-center gap-10">
        <b className="b">{PLACE_WORDS[pattern.where]}</b>
        <span className="sm mute">{pattern.mark}, such as</span>
        <CodePlate groups={example.split(' ')} size="small" />
      </p>
      <DataTable
        caption={`Segments of the code ${PLACE_WORDS[pattern.where].toLowerCase()}`}
        columns={[
          { head: 'Place', phone: 'name', cell: (row) => row.name },
          {
            head: 'Characters',
            number: true,
            phone: 'amount',
            cell: (row) => String(row.length),
          },
          { head: 'What stands there', cell: (row) => <Meaning segment={row} /> },
        ]}
        rows={pattern.segments}
        rowKey={(row) => row.name}
      />
    </div>
  );
}

function Joints({ kind, variant }: { readonly kind: UnitKind; readonly variant: Variant }) {
  return (
    <DataTable<ShownJoint>
      caption={`Joints of ${variant.label}`}
      columns={[
        { head: 'Joint', phone: 'name', cell: (row) => <b className="b">{row.label}</b> },
        {
          head: 'This variant',
          cell: (row) => row.words ?? <span className="mute">Not known</span>,
        },
        {
          head: 'Weight in the verdict',
          phone: 'hidden',
          cell: (row) => (row.deciding ? 'Decides' : <span className="mute">Advises</span>),
        },
      ]}
      rows={shownJoints(kind, variant.interfaces)}
      rowKey={(row) => row.name}
    />
  );
}

const day = (date: string): string => formatDay(`${date}T12:00:00Z`, 'UTC').replace(/^\w+ /, '');

interface VariantViewProps {
  readonly kind: UnitKind;
  readonly variant: Variant;
  readonly open: boolean;
}

export function VariantView({ kind, variant, open }: VariantViewProps) {
  const { modelYears } = variant;
  return (
    <details className="variant" id={variant.id} open={open}>
      <summary>
        <span className="unit-name">{variant.label}</span>
        <span className="sm mute num">
          Model years {modelYears.from} to {modelYears.to}
        </span>
      </summary>
      <div className="variant-body">
        <p>
          Built {day(variant.builtFrom)} to {day(variant.builtTo)}. The stamp tells more than the model year.
        </p>
        <div className="grid desk:grid-cols-2 gap-x-36 gap-y-24">
          <div className="grid gap-18 content-start">
            <h3>Codes</h3>
            {variant.codePatterns.map((pattern) => (
              <Pattern key={pattern.where} pattern={pattern} variant={variant} />
            ))}
          </div>
          <div className="grid gap-18 content-start">
            <h3>Joints</h3>
            <Joints kind={kind} variant={variant} />
          </div>
        </div>
      </div>
    </details>
  );
}
