// Weight, size, fluid, hours, where it fails and what its hard parts cost.
import { TriangleAlert } from 'lucide-react';
import type { ReactNode } from 'react';
import type { FamilyPage } from '../../shared/catalogue/contract';
import { DataTable } from '../ui/data-table';
import { Icon } from '../ui/icon';
import { Money } from '../ui/money';
import { Section, Sheet } from '../ui/sheet';
import { CONTROL_WORDS, inches } from './family-words';

const LB_PER_KG = 2.204_622_6;
/** NIOSH 94-110: the load constant, for the best of all lifts. */
const ONE_PERSON_LB = 51;
const LITRES_PER_QUART = 0.946_352_946;

function Figure({ label, children }: { readonly label: string; readonly children: ReactNode }) {
  return (
    <div>
      <dt>{label}</dt>
      <dd>{children}</dd>
    </div>
  );
}

export function FamilyFigures({ family }: { readonly family: FamilyPage }) {
  const { benchHours: hours, dryWeightLb, fluidLitres } = family;
  return (
    <Sheet pad>
      <dl className="figures num">
        {family.kind !== 'axle' && <Figure label="Control">{CONTROL_WORDS[family.control]}</Figure>}
        <Figure label="Dry weight">
          {dryWeightLb} lb ({Math.round(dryWeightLb / LB_PER_KG)} kg)
        </Figure>
        <Figure label="Length, width, height">
          {inches(family.lengthMm)}, {inches(family.widthMm)}, {inches(family.heightMm)}
        </Figure>
        <Figure label="Fluid">{family.fluid}</Figure>
        <Figure label="Capacity">
          {(fluidLitres / LITRES_PER_QUART).toFixed(1)} qt ({fluidLitres.toFixed(1)} L)
        </Figure>
        <Figure label="Hours on the bench">
          {hours.likely}, from {hours.optimistic} to {hours.pessimistic}
        </Figure>
      </dl>
      {dryWeightLb > ONE_PERSON_LB && (
        <aside className="caution mt-14" aria-label="Caution">
          <Icon of={TriangleAlert} />
          <p>
            <b>Too heavy for one pair of arms.</b> Use a hoist, an engine crane or a transmission jack with
            its strap on.
            {family.kind === 'automatic' && ' The converter slides out when the unit tips: tie it in first.'}{' '}
            The service manual’s word counts over ours.
          </p>
        </aside>
      )}
    </Sheet>
  );
}

export function FamilyTroubles({ family }: { readonly family: FamilyPage }) {
  return (
    <div className="grid desk:grid-cols-2 gap-x-36">
      <Section title="Where it usually fails" note="Common practice, not a diagnosis">
        <Sheet>
          <DataTable
            caption="Usual failure points"
            columns={[
              { head: 'Part', phone: 'name', cell: (row) => <b className="b">{row.part}</b> },
              { head: 'What you notice', cell: (row) => row.sign },
            ]}
            rows={family.failurePoints}
            rowKey={(row) => row.part}
          />
        </Sheet>
      </Section>
      <Section title="Hard parts" note="What they cost used, each">
        <Sheet>
          <DataTable
            caption="Hard parts with their cost"
            columns={[
              { head: 'Part', phone: 'name', cell: (row) => row.name },
              {
                head: 'From',
                number: true,
                phone: 'labelled',
                cell: (row) => <Money cents={row.lowCents} />,
              },
              { head: 'To', number: true, phone: 'labelled', cell: (row) => <Money cents={row.highCents} /> },
            ]}
            rows={family.hardParts}
            rowKey={(row) => row.name}
          />
        </Sheet>
      </Section>
    </div>
  );
}
