// One unit in the list: a tag on the wire with its photo, name, code, grade and yard, and the money behind the tear line.
import type { Card } from '../../../shared/listings/card';
import { paths } from '../../paths';
import { CodePlate } from '../../ui/code-plate';
import { Flag } from '../../ui/flag';
import { GradeSquare } from '../../ui/grade-square';
import { Money } from '../../ui/money';
import { TagCard, TagLink } from '../../ui/tag-card';
import { When } from '../../ui/when';
import { KindDrawing } from '../kind-drawing';
import { offerOf, placeWords, STATE_WORDS } from '../unit-words';

const photosWords = (count: number): string => `${count} photo${count === 1 ? '' : 's'}`;

function Picture({ card }: { readonly card: Card }) {
  return (
    <div className="unit-photo">
      {card.photoUrl ? (
        <img src={card.photoUrl} alt="" loading="lazy" decoding="async" />
      ) : (
        <KindDrawing kind={card.kind} />
      )}
      <span>{card.photoCount === 0 ? 'No photo yet' : photosWords(card.photoCount)}</span>
    </div>
  );
}

function MoneyColumn({ card }: { readonly card: Card }) {
  const offer = offerOf(card);
  return (
    <div className="unit-money tag-tear">
      <div>
        <Money cents={offer.priceCents} size={28} />
        <p className="sm mute">{offer.words}</p>
      </div>
      <dl className="unit-sums num">
        {card.depositCents !== null && (
          <>
            <dt className="held">Deposit, comes back</dt>
            <dd className="held">
              <Money cents={card.depositCents} />
            </dd>
          </>
        )}
        <dt className="unit-sum">Pay today, before freight and tax</dt>
        <dd className="unit-sum">
          <Money cents={card.totalCents} />
        </dd>
      </dl>
    </div>
  );
}

export function ResultTag({ card }: { readonly card: Card }) {
  return (
    <TagCard className="unit-tag">
      <div className="unit-row">
        <Picture card={card} />
        <div className="unit-mid">
          <div>
            <h2 className="unit-name">
              <TagLink to={paths.listing.to({ id: card.id })}>{card.title}</TagLink>
            </h2>
            <div className="mt-8">
              <CodePlate groups={[card.caseCode]} size="small" />
            </div>
          </div>
          {card.state === 'in_vehicle' && (
            <div>
              <Flag tone="plain">{STATE_WORDS.in_vehicle}</Flag>
            </div>
          )}
          <div className="unit-yard">
            <GradeSquare grade={card.grade} size="small" />
            <span>
              <b className="b">{card.sellerName}</b>, {placeWords(card)}
              <span className="sm mute block">
                Used core, graded by the yard. Listed <When at={card.listedAt} show="short-day" />
              </span>
            </span>
          </div>
        </div>
        <MoneyColumn card={card} />
      </div>
    </TagCard>
  );
}
