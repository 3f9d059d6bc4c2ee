// Everything the code book knows of one family.
import type { FamilyPage } from '../../shared/catalogue/contract';
import { LAYOUT_WORDS, type Gears } from '../../shared/catalogue/gear-layout';
import { Section, Sheet } from '../ui/sheet';
import { FamilyFigures, FamilyTroubles } from './family-figures';
import { GearPictures, hasPictures } from './gear-pictures';
import { GearTable } from './gear-table';
import { VariantView } from './variant-view';

function layoutWords(gears: Gears): string {
  switch (gears.type) {
    case 'planetary':
      return LAYOUT_WORDS[gears.layout];
    case 'countershaft':
      return `Countershaft driven ${gears.input} to ${gears.counter}`;
    case 'planetary_low':
      return gears.sprocket === null
        ? 'One planetary set'
        : `One planetary set, chain on ${gears.sprocket} and ${gears.sprocket} teeth`;
    case 'geared_low':
      return 'Two pairs of gears over an idler';
    case 'chain_only':
      return `Chain on ${gears.sprocket} and ${gears.sprocket} teeth`;
    case 'ring_and_pinion':
      return `Ring gear of ${Math.round(gears.ringGearMm)} mm`;
  }
}

interface FamilyViewProps {
  readonly family: FamilyPage;
  /** The variant to open; the first when null or not of this family. */
  readonly variantId: string | null;
}

export function FamilyView({ family, variantId }: FamilyViewProps) {
  const chosen = family.variants.find((one) => one.id === variantId) ?? family.variants[0];
  return (
    <>
      <div className="family-top">
        <Section title="Gears" note={layoutWords(family.gears)}>
          <Sheet>
            <GearTable gears={family.gears} />
          </Sheet>
        </Section>
        <Section title="Figures">
          <FamilyFigures family={family} />
        </Section>
      </div>
      {hasPictures(family.gears) && (
        <Section title="Planetary sets" note="Drawn from the tooth counts">
          <Sheet pad>
            <GearPictures gears={family.gears} />
          </Sheet>
        </Section>
      )}
      <Section title="Variants" note="Same internals, different case and joints">
        <div className="grid gap-10">
          {family.variants.map((variant) => (
            <VariantView
              key={variant.id}
              kind={family.kind}
              variant={variant}
              open={variant.id === chosen?.id}
            />
          ))}
        </div>
      </Section>
      <FamilyTroubles family={family} />
      <p className="sm mute mt-28">Source: {family.source}.</p>
    </>
  );
}
