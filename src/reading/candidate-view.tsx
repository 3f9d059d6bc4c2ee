// One unit a code can be: the plate taken apart, what was assumed, and what contradicts the donor.
import { ArrowRight } from 'lucide-react';
import { paths } from '../paths';
import { ButtonLink } from '../ui/button';
import { DecodedCode } from '../ui/code-plate';
import { Sheet } from '../ui/sheet';
import { decodedGroups, doubtfulOf, type Candidate } from './decoded-groups';

const percent = (share: number): string => `${Math.round(share * 100)} %`;

interface CandidateViewProps {
  readonly candidate: Candidate;
  readonly alone: boolean;
}

export function CandidateView({ candidate, alone }: CandidateViewProps) {
  const { label, familyId, variantId, probability, assumed, conflicts } = candidate;
  return (
    <Sheet pad className="candidate">
      <div className="candidate-head">
        <h3 className="unit-name">{label}</h3>
        {!alone && <span className="sm mute num">{percent(probability)} likely, by count alone</span>}
      </div>
      <DecodedCode groups={decodedGroups(candidate)} doubtful={doubtfulOf(candidate)} />
      {assumed.length > 0 && (
        <ul className="candidate-notes">
          {assumed.map((one) => (
            <li key={one.index}>
              Character {one.index + 1} taken as <b className="code">{one.took}</b>. {one.why}.
            </li>
          ))}
        </ul>
      )}
      {conflicts.length > 0 && (
        <ul className="candidate-notes candidate-conflicts">
          {conflicts.map((conflict) => (
            <li key={conflict}>{conflict}</li>
          ))}
        </ul>
      )}
      <div className="flex flex-wrap gap-10">
        <ButtonLink
          {...(alone ? { look: 'go' as const, iconAfter: ArrowRight } : {})}
          to={paths.results.to({ familyId })}
        >
          Find cores of this family
        </ButtonLink>
        <ButtonLink to={paths.family.to({ id: familyId }, { variant: variantId })}>
          Open the code book
        </ButtonLink>
      </div>
    </Sheet>
  );
}
