// What comes back of the deposit at each grade, worked from the schedule while it is typed.
import { useState } from 'react';
import { useWatch } from 'react-hook-form';
import { scheduleForKind } from '../../../shared/accounts/schedule-for-kind';
import { KIND_WORDS, UNIT_KINDS, type UnitKind } from '../../../shared/catalogue/kinds';
import { GRADE_RULES } from '../../../shared/listings/condition';
import { returnByGrade, type GradeExample } from '../../../shared/listings/terms';
import { formatCents } from '../../../shared/kernel/money';
import { DataTable, type Column } from '../../ui/data-table';
import { Segment } from '../../ui/form/segment';
import type { TermsFormState } from './schedule-editor';

function backWords({ leastCents, mostCents }: GradeExample): string {
  return leastCents === mostCents
    ? formatCents(mostCents)
    : `${formatCents(leastCents)} to ${formatCents(mostCents)}`;
}

const COLUMNS: readonly Column<GradeExample>[] = [
  { head: 'Grade', phone: 'name', cell: (row) => row.grade },
  { head: 'Rule', phone: 'under', cell: (row) => GRADE_RULES[row.grade] },
  { head: 'Back to the builder', number: true, phone: 'amount', cell: backWords },
];

const KINDS = UNIT_KINDS.map((kind) => ({ value: kind, label: KIND_WORDS[kind].many }));

export function GradePreview({ form }: { readonly form: TermsFormState }) {
  const [kind, setKind] = useState<UnitKind>('automatic');
  const [depositCents, schedule, windowDays] = useWatch({
    control: form.control,
    name: ['depositCents', 'schedule', 'windowDays'],
  });
  if (depositCents === null) return null;
  const rows = returnByGrade(kind, {
    depositCents,
    windowDays,
    returnFreight: 'seller',
    // While an amount is typed the field holds none.
    schedule: scheduleForKind(kind, schedule).map((line) => ({ ...line, cents: line.cents ?? 0 })),
  });
  return (
    <div className="grid gap-14">
      <Segment legend="Kind of unit" options={KINDS} value={kind} onChange={setKind} tight />
      <DataTable
        caption="What comes back at each grade"
        columns={COLUMNS}
        rows={rows}
        rowKey={(row) => row.grade}
      />
    </div>
  );
}
