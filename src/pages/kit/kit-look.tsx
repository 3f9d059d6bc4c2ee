// The kit's first half: mark, colours, type, drawings, buttons, marks.
import { ArrowRight, Camera, Printer } from 'lucide-react';
import { TOKENS } from '../../styles/tokens';
import { AutomaticSide } from '../../ui/art/automatic-side';
import { AxleRear } from '../../ui/art/axle-rear';
import { ExplodedUnit } from '../../ui/art/exploded-unit';
import { JointGlyph, JOINT_WORDS } from '../../ui/art/joint-glyph';
import { ManualSide } from '../../ui/art/manual-side';
import { Mark } from '../../ui/art/mark';
import { Planetary } from '../../ui/art/planetary';
import { SpragClutch } from '../../ui/art/sprag-clutch';
import { TransferCaseSide } from '../../ui/art/transfer-case-side';
import { Button, ButtonLink } from '../../ui/button';
import { CodePlate, DecodedCode } from '../../ui/code-plate';
import { Count } from '../../ui/count';
import { DueBy, DueChip } from '../../ui/due-chip';
import { Flag } from '../../ui/flag';
import { GradeSquare } from '../../ui/grade-square';
import { HandNote } from '../../ui/hand-note';
import { JointStrip } from '../../ui/joint-strip';
import { Money } from '../../ui/money';
import { Section, Sheet } from '../../ui/sheet';
import { StepRace } from '../../ui/step-race';
import { TagCard, TagLink, Wire } from '../../ui/tag-card';
import { CODE, DECODED, JOINTS, NOW, PHOTO_SENT, ZONE } from './samples';

const VERDICTS = ['fits', 'with_part', 'no_fit', 'not_known'] as const;

function Colours() {
  return (
    <Section title="Mark and colour" note="The theme shown is the one chosen">
      <Sheet className="mb-14 flex flex-wrap items-center gap-28 p-24">
        <Mark size={64} />
        <b style={{ font: '850 2.125rem/1 var(--f-display)', fontStretch: '96%' }}>SPRAGYARD</b>
      </Sheet>
      <div className="grid grid-cols-4 desk:grid-cols-8">
        {Object.keys(TOKENS).map((name) => (
          <div key={name} className="border-1 border-line">
            <div className="h-44" style={{ background: `var(--${name})` }} />
            <span className="xs block bg-sheet p-4">{name}</span>
          </div>
        ))}
      </div>
    </Section>
  );
}

function Type() {
  return (
    <Section title="Type">
      <div className="grid gap-14">
        <span
          className="font-display text-hero-phone tablet:text-hero"
          style={{ fontWeight: 840, fontStretch: '92%' }}
        >
          Swap once.
        </span>
        <span
          className="font-display text-h1-phone tablet:text-h1"
          style={{ fontWeight: 780, fontStretch: '86%' }}
        >
          Heading 46, Anybody 780
        </span>
        <h2>Heading 24, width 86</h2>
        <h3>Heading 18</h3>
        <p className="lead">Lead 19: buy a pulled unit, rebuild it on your bench, swap it in a day.</p>
        <p>Body 16/24, Archivo 450. The deposit comes back when the core passes the bench.</p>
        <p className="sm mute">Small 14, second ink. Odometer 118,400 mi.</p>
        <p>
          <Money cents={145_000} size={28} /> tabular figures, <Money cents={-4_000} />,{' '}
          <Money cents={60_000} tone="held" />
        </p>
        <p className="flex items-end gap-14">
          <Count value={9} /> <Count value={23} big /> counts
        </p>
      </div>
    </Section>
  );
}

function Buttons() {
  return (
    <Section title="Buttons and steps">
      <div className="grid gap-14">
        <div className="flex flex-wrap gap-14">
          <Button look="go" iconAfter={ArrowRight}>
            Buy for exchange
          </Button>
          <Button icon={Printer}>Print tag</Button>
          <Button look="ink">Save</Button>
          <Button disabled>Needs a photo</Button>
          <Button busy busyWords="Saving">
            Save
          </Button>
          <ButtonLink to="/kit" size="small">
            A small link
          </ButtonLink>
          <a className="link self-center" href="/kit">
            A link
          </a>
        </div>
        <Button look="go" size="yard" full icon={Camera}>
          Yard size, 76 px
        </Button>
        <StepRace
          label="Steps"
          words
          steps={[
            { label: 'Proved', state: 'proved' },
            { label: 'Now', state: 'now' },
            { label: 'Not yet', state: 'todo' },
          ]}
        />
        <div className="flex flex-wrap items-start gap-24">
          <DueChip words="9 days left, Wed 25 Mar" leftShare={0.3} />
          <DueBy dueAt="2026-03-17T05:59:59Z" startedAt="2026-03-12T15:00:00Z" now={NOW} zone={ZONE} />
          <DueBy dueAt="2026-03-14T05:59:59Z" startedAt="2026-03-01T15:00:00Z" now={NOW} zone={ZONE} />
        </div>
      </div>
    </Section>
  );
}

function Tags() {
  return (
    <Section title="Tags and plates">
      <Wire className="grid gap-14 pb-20">
        <TagCard>
          <div className="flex flex-wrap items-center gap-18 p-14">
            <img className="h-96" src={PHOTO_SENT} alt="Stand-in" />
            <div className="grid gap-8 flex-1">
              <TagLink className="unit-name" to="/kit">
                Keld 66A, 4x4
              </TagLink>
              <span>
                <CodePlate groups={CODE} size="small" />
              </span>
              <span className="sm mute">Quenby Dismantlers, Marrow Creek</span>
            </div>
            <HandNote>Runs good. Row 14</HandNote>
          </div>
        </TagCard>
        <TagCard>
          <div className="p-14">
            <b className="unit-name">A second tag on the wire</b>
          </div>
        </TagCard>
      </Wire>
      <TagCard flat>
        <div className="p-14">
          <b className="unit-name">Flat, inside a column</b>
        </div>
      </TagCard>
      <div className="my-14 flex flex-wrap gap-14">
        <CodePlate groups={CODE} />
        <CodePlate groups={['K66A', '4X']} doubtful={[3]} />
        {(['A', 'B', 'C', 'D'] as const).map((grade) => (
          <GradeSquare key={grade} grade={grade} />
        ))}
        <GradeSquare grade="A" size="small" />
        <GradeSquare grade="B" size="desk" />
      </div>
      <Sheet pad>
        <DecodedCode groups={DECODED} doubtful={[8]} />
      </Sheet>
    </Section>
  );
}

function Fit() {
  return (
    <Section title="Fit marks and flags">
      <div className="grid gap-14">
        <div className="flex flex-wrap gap-18">
          {VERDICTS.map((state) => (
            <span key={state} className="flex items-center gap-8">
              <JointGlyph state={state} />
              {JOINT_WORDS[state]}
            </span>
          ))}
        </div>
        <JointStrip joints={JOINTS} />
        <div className="flex flex-wrap gap-10">
          {[...VERDICTS, 'held', 'stop'].map((tone) => (
            <Flag
              key={tone}
              tone={VERDICTS.find((one) => one === tone) ?? (tone === 'held' ? 'held' : 'stop')}
            />
          ))}
          <Flag tone="plain">Sold, load 18 Mar</Flag>
        </div>
      </div>
    </Section>
  );
}

function Drawings() {
  return (
    <Section title="Line drawings">
      <div className="mb-20 overflow-x-auto">
        <ExplodedUnit className="w-full" />
      </div>
      <div className="grid gap-px bg-line grid-cols-2 desk:grid-cols-4">
        {[AutomaticSide, ManualSide, TransferCaseSide, AxleRear].map((Drawn, index) => (
          <div key={index} className="bg-sheet p-14">
            <Drawn />
          </div>
        ))}
        <div className="bg-sheet p-14">
          <Planetary sunTeeth={34} ringTeeth={74} held="ring" />
        </div>
        <div className="bg-sheet p-14">
          <Planetary sunTeeth={30} ringTeeth={66} planets={4} held="sun" />
        </div>
        <div className="bg-sheet p-14">
          <Planetary sunTeeth={28} ringTeeth={68} held="carrier" />
        </div>
        <div className="bg-sheet p-14">
          <SpragClutch live={4} />
        </div>
      </div>
    </Section>
  );
}

export function KitLook() {
  return (
    <>
      <Colours />
      <Type />
      <Buttons />
      <Tags />
      <Fit />
      <Drawings />
    </>
  );
}
