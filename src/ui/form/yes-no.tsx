// Yes or no, at glove size. A no that takes money off is amber and says how much.
import { formatCents, type Cents } from '../../../shared/kernel/money';
import { Segment } from './segment';

export type YesNoAnswer = 'yes' | 'no';

interface YesNoProps {
  /** The question: "Pan on". */
  readonly legend: string;
  readonly legendShown?: boolean;
  readonly value: YesNoAnswer | null;
  readonly onChange: (value: YesNoAnswer) => void;
  /** What a no takes off the deposit, as in the terms. */
  readonly noCostsCents?: Cents;
  readonly name?: string;
  readonly error?: string | undefined;
  readonly disabled?: boolean;
}

export function YesNo({ noCostsCents = 0, ...rest }: YesNoProps) {
  const costs = noCostsCents > 0;
  return (
    <Segment
      {...rest}
      yard
      options={[
        { value: 'yes', label: 'Yes' },
        { value: 'no', label: 'No', costs, ...(costs ? { note: formatCents(-noCostsCents) } : {}) },
      ]}
    />
  );
}
