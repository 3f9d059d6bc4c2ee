// Waiting: a race whose sprags tip one by one, with words of what is being read or checked.
import clsx from 'clsx';
import { Sprag } from './art/sprag';
import { cssVars } from './css-vars';

interface WaitingStateProps {
  /** "Checking joint 3 of 8, plug" or "Reading the stock" */
  readonly words: string;
  /** How many of the steps are done, where that is known. */
  readonly done?: number;
  readonly of?: number;
  /** Grey bars where the text will stand. */
  readonly blanks?: number;
}

/** Ever slower: seconds after which each sprag tips when the count isn't known. */
const DELAYS_S = [0.15, 0.5, 1, 1.8, 3, 5, 8];
const BLANK_WIDTHS = ['92%', '70%', '84%', '58%'];

const delay = (index: number) => cssVars({ '--waiting-delay': `${DELAYS_S[index] ?? 60}s` });

const mark = (index: number, done: number) =>
  index < done ? 'waiting-done' : index === done ? 'waiting-now' : '';

export function WaitingState({ words, done, of = 8, blanks = 3 }: WaitingStateProps) {
  const counted = done !== undefined;
  return (
    <div className="waiting" role="status">
      <b className="b">{words}</b>
      <div className={clsx('waiting-race', !counted && 'waiting-open')} aria-hidden="true">
        {Array.from({ length: of }, (_, index) => (
          <span key={index} style={counted ? undefined : delay(index)} className="contents">
            <Sprag
              size={28}
              state={counted && index <= done ? 'proved' : 'stopped'}
              className={counted ? mark(index, done) : ''}
            />
          </span>
        ))}
      </div>
      {Array.from({ length: blanks }, (_, index) => (
        <div
          key={index}
          className="waiting-blank"
          style={{ width: BLANK_WIDTHS[index % 4] }}
          aria-hidden="true"
        />
      ))}
    </div>
  );
}
