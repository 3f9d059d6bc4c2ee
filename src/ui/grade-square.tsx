// A core's grade, stamped in a square frame.
import clsx from 'clsx';

export type GradeLetter = 'A' | 'B' | 'C' | 'D';

interface GradeSquareProps {
  readonly grade: GradeLetter;
  /** 30, 40 and 96 px; `desk` is the receiving desk's. */
  readonly size?: 'small' | 'normal' | 'desk';
}

export function GradeSquare({ grade, size = 'normal' }: GradeSquareProps) {
  return (
    <span
      className={clsx('grade', size !== 'normal' && `grade-${size}`)}
      role="img"
      aria-label={`Grade ${grade}`}
    >
      {grade}
    </span>
  );
}
