// From the segments of a reading to the groups of a drawn plate: year and day stand together as the build date.
import type { z } from 'zod';
import type { readCodeAnswer } from '../../shared/reading/contract';
import type { DecodedGroup } from '../ui/code-plate';
import { formatDay } from '../ui/dates';

export type Candidate = z.infer<typeof readCodeAnswer>['candidates'][number];

const DATE_NAMES: readonly string[] = ['Year', 'Day'];

/** "27 May 2009" of an ISO date. */
export const dayWords = (date: string): string => formatDay(`${date}T12:00:00Z`, 'UTC').replace(/^\w+ /, '');

function dateGroup(parts: Candidate['segments'], builtOn: string | null): DecodedGroup {
  return {
    value: parts.map((part) => part.value).join(''),
    label: 'Built',
    meaning: builtOn ? dayWords(builtOn) : parts.map((part) => part.meaning).join('. '),
    ...(builtOn
      ? { detail: parts.map((part) => `${part.name.toLowerCase()} ${part.value}`).join(', ') }
      : {}),
  };
}

/** "Four-wheel-drive output, 31-spline" as a meaning and its detail. */
function plainGroup({ name, value, meaning }: Candidate['segments'][number]): DecodedGroup {
  const comma = meaning.indexOf(', ');
  if (comma < 0) return { value, label: name, meaning };
  return { value, label: name, meaning: meaning.slice(0, comma), detail: meaning.slice(comma + 2) };
}

export function decodedGroups({
  segments,
  builtOn,
}: Pick<Candidate, 'segments' | 'builtOn'>): DecodedGroup[] {
  const groups: DecodedGroup[] = [];
  let dates: Candidate['segments'][number][] = [];
  const closeDate = (): void => {
    if (dates.length > 0) groups.push(dateGroup(dates, builtOn));
    dates = [];
  };
  for (const segment of segments) {
    if (DATE_NAMES.includes(segment.name)) dates.push(segment);
    else {
      closeDate();
      groups.push(plainGroup(segment));
    }
  }
  closeDate();
  return groups;
}

/** Characters that were lost or filled in, counted over the groups. */
export function doubtfulOf({ segments, assumed }: Pick<Candidate, 'segments' | 'assumed'>): number[] {
  const lost = [...segments.map((segment) => segment.value).join('')].flatMap((character, index) =>
    character === '?' ? [index] : [],
  );
  return [...lost, ...assumed.map((one) => one.index)].sort((a, b) => a - b);
}
