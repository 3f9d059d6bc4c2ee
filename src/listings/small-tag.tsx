// A unit in short: photo, name, code, yard and price, for lists beside the main matter.
import type { Card } from '../../shared/listings/card';
import { paths } from '../paths';
import { CodePlate } from '../ui/code-plate';
import { Money } from '../ui/money';
import { TagCard, TagLink } from '../ui/tag-card';
import { When } from '../ui/when';
import { formatCents } from '../../shared/kernel/money';
import { KindDrawing } from './kind-drawing';
import { offerOf, placeWords } from './unit-words';

interface SmallTagProps {
  readonly card: Card;
  readonly level?: 2 | 3;
}

export function SmallTag({ card, level = 3 }: SmallTagProps) {
  const Heading = level === 2 ? 'h2' : 'h3';
  const offer = offerOf(card);
  return (
    <TagCard>
      <div className="small-tag">
        <div className="small-tag-photo">
          {card.photoUrl ? (
            <img src={card.photoUrl} alt="" loading="lazy" decoding="async" />
          ) : (
            <KindDrawing kind={card.kind} />
          )}
        </div>
        <div>
          <Heading className="unit-name">
            <TagLink to={paths.listing.to({ id: card.id })}>{card.title}</TagLink>
          </Heading>
          <div className="mt-6 mb-6">
            <CodePlate groups={[card.caseCode]} size="small" />
          </div>
          <p className="sm mute">
            {card.sellerName}, {placeWords(card)}
            <br />
            Used core, grade {card.grade}. Listed <When at={card.listedAt} show="short-day" />
          </p>
        </div>
        <div className="small-tag-money">
          <Money cents={offer.priceCents} size={22} />
          <span className="sm mute">
            {card.depositCents === null
              ? 'outright'
              : `exchange, plus ${formatCents(card.depositCents)} deposit`}
          </span>
        </div>
      </div>
    </TagCard>
  );
}
