// Check a code: what is stamped on the case, and the number of the vehicle it came out of.
import { useSearchParams } from 'react-router-dom';
import { unitKind } from '../../shared/catalogue/kinds';
import { CodeReader, type CodeWords } from '../reading/code-reader';
import { VinCheck } from '../reading/vin-check';
import { Page } from '../shell/layout';
import { PageHead } from '../ui/page-title';
import { Section, Sheet } from '../ui/sheet';

export function CodePage() {
  const [search, setSearch] = useSearchParams();
  const words: CodeWords = {
    text: search.get('code') ?? '',
    kind: unitKind.safeParse(search.get('kind')).data ?? null,
    year: search.get('year') ?? '',
  };
  const change = ({ text, kind, year }: CodeWords): void =>
    setSearch(
      { ...(text ? { code: text } : {}), ...(kind ? { kind } : {}), ...(year ? { year } : {}) },
      { replace: true },
    );
  return (
    <Page>
      <PageHead
        title="Check a code"
        under={<span className="mute">The stamp on the case tells more than the year on the windscreen</span>}
      />
      <CodeReader words={words} onWords={change} />
      <Section title="Check a vehicle number" note="Check digit and model year, 49 CFR 565">
        <Sheet pad>
          <VinCheck />
        </Sheet>
      </Section>
    </Page>
  );
}
