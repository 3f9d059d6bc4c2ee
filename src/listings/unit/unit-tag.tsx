// The unit's own tag across the page: its name, the yard's hand, tag number, where and when it was pulled.
import { formatTag } from '../../../shared/kernel/tag-code';
import type { ListingPage } from '../../../shared/listings/page';
import { KIND_WORDS } from '../../../shared/catalogue/kinds';
import { Flag } from '../../ui/flag';
import { HandNote } from '../../ui/hand-note';
import { PageTitle } from '../../ui/page-title';
import { TagCard, Wire } from '../../ui/tag-card';
import { When } from '../../ui/when';
import { mileageWords, STATE_WORDS } from '../unit-words';
import { splitNotes } from './notes';

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);

export function UnitTag({ unit }: { readonly unit: ListingPage }) {
  const { hand } = splitNotes(unit.notes);
  const family = unit.family;
  const what = `${capital(KIND_WORDS[unit.kind].one)}, ${unit.variantName}`;
  return (
    <Wire>
      <TagCard className="unit-head">
        <div className="unit-head-row">
          <div>
            <PageTitle title={unit.title}>{family.name}</PageTitle>
            <p className="unit-head-what">{what}</p>
            <div className="mt-10 flex flex-wrap gap-10">
              <Flag tone="plain">{unit.usedNotice}</Flag>
              {unit.state === 'in_vehicle' && <Flag tone="with_part">{STATE_WORDS.in_vehicle}</Flag>}
            </div>
          </div>
          {hand && <HandNote>{hand}</HandNote>}
          <div className="unit-head-id num tag-tear">
            <b className="b">Tag {formatTag(unit.tagCode)}</b>
            <span>
              Listed <When at={unit.listedAt} />
            </span>
            <span>{mileageWords(unit.mileage)}</span>
            {unit.donor && (
              <span>
                Out of {unit.donor.year ? `a ${unit.donor.year} ` : ''}
                {unit.donor.description}
              </span>
            )}
          </div>
        </div>
      </TagCard>
    </Wire>
  );
}
