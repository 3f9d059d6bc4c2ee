// The case code taken apart: each group over what it means.
import type { ListingPage } from '../../../shared/listings/page';
import { CodePlate, DecodedCode } from '../../ui/code-plate';
import { formatDay } from '../../ui/dates';
import { Section } from '../../ui/sheet';

export function CodeApart({ unit }: { readonly unit: ListingPage }) {
  const shot = unit.shots.find((one) => one.code === 'code' && one.photos.length > 0);
  return (
    <Section
      title="Case code"
      note={shot ? `Compare it with shot ${shot.number}, ${shot.name.toLowerCase()}` : 'Not in the photos'}
    >
      {unit.code ? (
        <div className="sheet unit-code">
          <DecodedCode
            groups={unit.code.segments.map((one) => ({
              value: one.value,
              label: one.name,
              meaning: one.meaning,
            }))}
          />
          {unit.code.builtOn && (
            <p className="sm">
              Built <b className="b">{formatDay(`${unit.code.builtOn}T12:00:00Z`, 'UTC')}</b>, by the code
              book.
            </p>
          )}
        </div>
      ) : (
        <div className="sheet sheet-pad grid gap-10">
          <p>
            <CodePlate groups={[unit.caseCode]} />
          </p>
          <p className="sm">
            The code book does not know this code. Compare it with the photo of the code pad before you pay.
          </p>
        </div>
      )}
    </Section>
  );
}
