// What the unit is and what it takes to move it: ratios, weight, fluid, and the figures for the carrier.
import type { ListingPage } from '../../../shared/listings/page';
import { Section } from '../../ui/sheet';

interface Fact {
  readonly label: string;
  readonly words: string;
}

const CONTROL: Readonly<Record<string, string>> = {
  hydraulic: 'Hydraulic',
  electronic: 'Electronic',
  none: 'None',
};

const ratio = (value: number): string => value.toFixed(2).replace('-', '\u2212');

function unitFacts({ family, kind }: ListingPage): Fact[] {
  const list: (Fact | false)[] = [
    family.forwardRatios.length > 0 && {
      label: kind === 'axle' ? 'Ratios of the family' : 'Forward ratios',
      words: family.forwardRatios.map(ratio).join(', '),
    },
    family.reverseRatio !== null && { label: 'Reverse', words: ratio(family.reverseRatio) },
    family.lowRange !== null && { label: 'Low range', words: ratio(family.lowRange) },
    family.control !== null &&
      family.control !== 'none' && {
        label: 'Control',
        words: CONTROL[family.control] ?? family.control,
      },
    family.weightLb !== null && { label: 'Dry weight', words: `${family.weightLb} lb, without converter` },
    family.fluid !== null && { label: 'Fluid', words: family.fluid },
  ];
  return list.filter((fact) => fact !== false);
}

function freightFacts({ freight, shipDays, seller }: ListingPage): Fact[] {
  const { figures, quote } = freight;
  return [
    {
      label: 'On the pallet',
      words: `${figures.weightLb} lb, ${figures.lengthIn} x ${figures.widthIn} x ${figures.heightIn} in`,
    },
    ...(quote
      ? [
          { label: 'Density and class', words: `${quote.densityPcf} lb/ft³, class ${quote.freightClass}` },
          {
            label: `To ${quote.toZip}`,
            words: `${quote.miles.toLocaleString('en-US')} mi, ${quote.daysLow} to ${quote.daysHigh} days on the road`,
          },
        ]
      : []),
    {
      label: 'Ready for the carrier',
      words: shipDays === 1 ? '1 business day after you pay' : `${shipDays} business days after you pay`,
    },
    { label: 'Pick it up yourself', words: `${seller.city}, ${seller.region} ${seller.zip}, no charge` },
  ];
}

function FactList({ facts }: { readonly facts: readonly Fact[] }) {
  return (
    <dl className="fact-list num">
      {facts.map((fact) => (
        <div key={fact.label}>
          <dt>{fact.label}</dt>
          <dd>{fact.words}</dd>
        </div>
      ))}
    </dl>
  );
}

export function UnitFacts({ unit }: { readonly unit: ListingPage }) {
  return (
    <Section title="The unit, and moving it" note="Freight is an estimate: the carrier measures again">
      <div className="sheet fact-pair">
        <FactList facts={unitFacts(unit)} />
        <FactList facts={freightFacts(unit)} />
      </div>
    </Section>
  );
}
