// What can hurt somebody who moves, drains or opens this unit.
import type { ListingPage } from '../../../shared/listings/page';
import { Section } from '../../ui/sheet';

export function UnitCautions({ unit }: { readonly unit: ListingPage }) {
  const { hazards } = unit.condition;
  if (hazards.length === 0) return null;
  return (
    <Section title="Before you lift it">
      <ul className="caution-list">
        {hazards.map((hazard) => (
          <li key={hazard}>{hazard}</li>
        ))}
      </ul>
      <p className="sm mute mt-10">
        The service manual of the unit, your local codes and licensed practice come first.
      </p>
    </Section>
  );
}
