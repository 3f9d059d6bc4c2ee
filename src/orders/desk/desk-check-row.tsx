// One check of the desk: yes or no at glove size, the amount beside a no that costs money, and the photo that proves it.
import { Camera } from 'lucide-react';
import clsx from 'clsx';
import { useRef } from 'react';
import { formatCents } from '../../../shared/kernel/money';
import { Icon } from '../../ui/icon';
import { YesNo } from '../../ui/form/yes-no';
import { PHOTO_TYPES } from '../photos/photo-types';
import type { OrderPhoto } from '../photos/use-photo-uploads';
import type { DeskAnswer, DeskCheck } from '../view/desk-checks';

export const checkName = (code: string): string => `check-${code}`;

interface DeskCheckRowProps {
  readonly number: number;
  readonly check: DeskCheck;
  readonly answer: DeskAnswer | null;
  readonly onAnswer: (given: DeskAnswer) => void;
  readonly photo: OrderPhoto | undefined;
  readonly uploading: boolean;
  readonly onPhoto: (file: File) => void;
  readonly error?: string | undefined;
}

function CheckPhoto({
  number,
  check,
  photo,
  uploading,
  onPhoto,
}: Omit<DeskCheckRowProps, 'answer' | 'onAnswer'>) {
  const input = useRef<HTMLInputElement>(null);
  const words = photo
    ? `Shoot check ${number} again: ${check.label}`
    : `Photo for check ${number}: ${check.label}`;
  return (
    <div>
      <input
        ref={input}
        className="vh"
        type="file"
        accept={PHOTO_TYPES}
        tabIndex={-1}
        aria-hidden="true"
        onChange={(event) => {
          const file = event.target.files?.[0];
          if (file) onPhoto(file);
          event.target.value = '';
        }}
      />
      <button
        type="button"
        className="desk-photo"
        aria-label={words}
        aria-busy={uploading || undefined}
        onClick={() => input.current?.click()}
      >
        {photo ? <img src={photo.thumbUrl} alt="" /> : <Icon of={Camera} />}
      </button>
    </div>
  );
}

export function DeskCheckRow(props: DeskCheckRowProps) {
  const { number, check, answer, onAnswer, error } = props;
  const costs = answer === 'no' && check.costCents > 0;
  return (
    <li className={clsx('desk-check', costs && 'desk-check-costs')}>
      <span className="desk-number num" aria-hidden="true">
        {number}
      </span>
      <div>
        <b>{check.label}</b>
        {answer === 'no' ? (
          <span className="sm">
            {check.costCents > 0 ? (
              <>
                Takes off <span className="b num">{formatCents(check.costCents)}</span>, as in the terms
              </>
            ) : (
              'Changes the grade; the terms take nothing off'
            )}
          </span>
        ) : (
          check.hint && <span className="sm mute">{check.hint}</span>
        )}
      </div>
      <CheckPhoto {...props} />
      <YesNo
        legend={check.label}
        name={checkName(check.code)}
        value={answer}
        onChange={onAnswer}
        {...(check.costCents > 0 ? { noCostsCents: check.costCents } : {})}
        error={error}
      />
    </li>
  );
}
