// Reads a case code while it is typed; the address holds what was typed, so that it can be sent to somebody.
import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { KIND_WORDS, UNIT_KINDS, type UnitKind } from '../../shared/catalogue/kinds';
import { FourStates } from '../ui/four-states';
import { Flag, type FlagTone } from '../ui/flag';
import { Select } from '../ui/form/select';
import { TextInput } from '../ui/form/text-input';
import { codeQuery } from './api';
import { CandidateView } from './candidate-view';
import type { Candidate } from './decoded-groups';
import { useSettled } from './use-settled';
import { WhereToLook } from './where-to-look';

const PAUSE_MS = 250;

export interface CodeWords {
  readonly text: string;
  readonly kind: UnitKind | null;
  /** As typed. */
  readonly year: string;
}

interface Answer {
  readonly candidates: readonly Candidate[];
  readonly verdict: 'sure' | 'likely' | 'cannot_tell';
}

const donorYearOf = (year: string): number | null => (/^(19|20)\d\d$/.test(year) ? Number(year) : null);

function verdictOf({ verdict, candidates }: Answer): { tone: FlagTone; flag: string; words: ReactNode } {
  if (verdict === 'sure')
    return {
      tone: 'fits',
      flag: 'Sure',
      words: 'Every character reads, and only this unit bears such a code.',
    };
  if (verdict === 'likely')
    return {
      tone: 'with_part',
      flag: 'Likely',
      words:
        'Only this unit is left, but not every character was read. Check it against a photo of the stamp.',
    };
  if (candidates.length === 0)
    return {
      tone: 'not_known',
      flag: 'Cannot tell',
      words:
        'No unit in the code book bears this code. Check each character; type ? for one you can’t make out.',
    };
  return {
    tone: 'not_known',
    flag: 'Cannot tell',
    words: `It can be any of ${candidates.length} units. More of the code, or another number on the case, will tell.`,
  };
}

function Reading({ answer }: { readonly answer: Answer }) {
  const { tone, flag, words } = verdictOf(answer);
  return (
    <div className="grid gap-14">
      <p className="flex flex-wrap items-center gap-10" role="status">
        <Flag tone={tone}>{flag}</Flag>
        <span>{words}</span>
      </p>
      {answer.candidates.map((candidate) => (
        <CandidateView
          key={candidate.variantId}
          candidate={candidate}
          alone={answer.candidates.length === 1}
        />
      ))}
    </div>
  );
}

interface CodeReaderProps {
  readonly words: CodeWords;
  readonly onWords: (words: CodeWords) => void;
}

export function CodeReader({ words, onWords }: CodeReaderProps) {
  const text = useSettled(words.text.trim(), PAUSE_MS);
  const options = codeQuery({ text, kind: words.kind, donorYear: donorYearOf(words.year) });
  const query = useQuery({ ...options, placeholderData: (before) => before });
  const asks = options.enabled === true;
  return (
    <div className="reader">
      <div className="reader-form">
        <TextInput
          label="What is stamped, cast or printed"
          hint="Type ? for a character you can’t make out. Spaces and small letters don’t matter."
          code
          name="code"
          maxLength={64}
          value={words.text}
          onChange={(event) => onWords({ ...words, text: event.target.value })}
        />
        <Select
          label="Kind of unit"
          optional
          placeholder="Any kind"
          name="kind"
          options={UNIT_KINDS.map((kind) => ({ value: kind, label: capital(KIND_WORDS[kind].one) }))}
          value={words.kind ?? ''}
          onChange={(event) =>
            onWords({ ...words, kind: UNIT_KINDS.find((kind) => kind === event.target.value) ?? null })
          }
        />
        <TextInput
          label="Donor’s model year"
          optional
          name="year"
          inputMode="numeric"
          maxLength={4}
          value={words.year}
          onChange={(event) => onWords({ ...words, year: event.target.value })}
        />
      </div>
      {asks ? (
        <FourStates query={query} waiting="Reading the code">
          {(answer) => <Reading answer={answer} />}
        </FourStates>
      ) : (
        <WhereToLook />
      )}
    </div>
  );
}

const capital = (text: string): string => text.charAt(0).toUpperCase() + text.slice(1);
