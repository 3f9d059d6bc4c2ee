// A case code as it is stamped on a cast pad; a character nobody is sure of is amber.
import clsx from 'clsx';
import type { ReactNode } from 'react';
import { cssVars } from './css-vars';

interface CodePlateProps {
  /** The code in its groups: ['K66A', '4X', 'D9', '09147', '03']. */
  readonly groups: readonly string[];
  readonly size?: 'normal' | 'small';
  /** Indexes of doubtful characters, counted over the groups joined. */
  readonly doubtful?: readonly number[];
}

interface Mark {
  readonly character: string;
  readonly doubtful: boolean;
}

function marksOf(groups: readonly string[], doubtful: readonly number[]): Mark[][] {
  let index = -1;
  return groups.map((group) =>
    [...group].map((character) => {
      index += 1;
      return { character, doubtful: doubtful.includes(index) };
    }),
  );
}

function Group({ marks }: { readonly marks: readonly Mark[] }): ReactNode {
  return marks.map((mark, index) =>
    mark.doubtful ? (
      <span key={index} className="plate-doubt">
        {mark.character}
      </span>
    ) : (
      mark.character
    ),
  );
}

function spoken(groups: readonly string[], doubtful: readonly number[]): string {
  const unsure = [...groups.join('')].filter((_, index) => doubtful.includes(index));
  return `Case code ${groups.join(' ')}${unsure.length > 0 ? `, not sure of ${unsure.join(' and ')}` : ''}`;
}

export function CodePlate({ groups, size = 'normal', doubtful = [] }: CodePlateProps) {
  return (
    <span
      className={clsx('plate', size === 'small' && 'plate-small')}
      role="img"
      aria-label={spoken(groups, doubtful)}
    >
      {marksOf(groups, doubtful).map((marks, index) => (
        <span key={index} aria-hidden="true">
          <Group marks={marks} />
        </span>
      ))}
    </span>
  );
}

export interface DecodedGroup {
  readonly value: string;
  /** "Built" */
  readonly label: string;
  /** "27 May 2009" */
  readonly meaning: string;
  /** "year 09, day 147" */
  readonly detail?: string;
}

interface DecodedCodeProps {
  readonly groups: readonly DecodedGroup[];
  readonly doubtful?: readonly number[];
}

/** The big form: the plate over brackets, each bracket over its meaning. On a phone the meanings become a list. */
export function DecodedCode({ groups, doubtful = [] }: DecodedCodeProps) {
  const values = groups.map((group) => group.value);
  const widths = groups.map((group) => `${Math.max(2, group.value.length) * 0.5 + 0.5}fr`).join(' ');
  const style = cssVars({ '--decoded-columns': widths, '--decoded-count': groups.length });
  return (
    <div className="decoded" style={style}>
      <div className="plate-big" role="img" aria-label={spoken(values, doubtful)}>
        {marksOf(values, doubtful).map((marks, index) => (
          <span key={index} aria-hidden="true">
            <Group marks={marks} />
          </span>
        ))}
      </div>
      <ol className="decoded-list">
        {groups.map((group) => (
          <li key={group.label}>
            <span className="code decoded-code">{group.value}</span>
            <div>
              <span className="lab">{group.label}</span>
              <b>{group.meaning}</b>
              {group.detail && <span className="sm mute">{group.detail}</span>}
            </div>
          </li>
        ))}
      </ol>
    </div>
  );
}
