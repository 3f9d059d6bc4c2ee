// Other units of the same family, the least to pay today first.
import { Link } from 'react-router-dom';
import type { ListingPage } from '../../../shared/listings/page';
import { Section } from '../../ui/sheet';
import { Wire } from '../../ui/tag-card';
import { SmallTag } from '../small-tag';
import { unitsPath } from '../search/units-path';

const SHOWN = 4;

export function SimilarUnits({ unit }: { readonly unit: ListingPage }) {
  if (unit.similar.length === 0) return null;
  return (
    <Section
      title={`Others of the family ${unit.family.name}`}
      note={
        <Link className="link" to={unitsPath({ familyId: [unit.family.id] })}>
          All of them
        </Link>
      }
    >
      <Wire className="results-list">
        {unit.similar.slice(0, SHOWN).map((card) => (
          <SmallTag key={card.id} card={card} level={3} />
        ))}
      </Wire>
    </Section>
  );
}
