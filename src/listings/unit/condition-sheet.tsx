// The condition report: the grade with its rule and what led to it, then every check with its answer.
import type { ListingPage } from '../../../shared/listings/page';
import { DataTable, type Column } from '../../ui/data-table';
import { GradeSquare } from '../../ui/grade-square';
import { Section } from '../../ui/sheet';

type Check = ListingPage['condition']['checks'][number];

const ANSWERS = { yes: 'Yes', no: 'No', unknown: 'Not known' } as const;

function AnswerWords({ check }: { readonly check: Check }) {
  if (check.answer === null) return <span className="mute">Not answered</span>;
  if (check.answer === 'yes') return <span className="ok">{ANSWERS.yes}</span>;
  return <span className="warn">{ANSWERS[check.answer]}</span>;
}

const COLUMNS: readonly Column<Check>[] = [
  {
    head: 'Check',
    phone: 'name',
    cell: (check) => (check.answer === 'no' ? `${check.label}. ${check.fault}` : check.label),
  },
  { head: 'Answer', phone: 'amount', cell: (check) => <AnswerWords check={check} /> },
];

export function ConditionSheet({ unit }: { readonly unit: ListingPage }) {
  const { condition } = unit;
  return (
    <Section title="Condition" note="Answered by the yard, check by check">
      <div className="sheet">
        <div className="unit-grade">
          <GradeSquare grade={condition.grade} />
          <div>
            <p className="b">{condition.rule}</p>
            {condition.because.length > 0 && (
              <p className="sm mute">Because: {condition.because.map((one) => one.label).join('; ')}.</p>
            )}
          </div>
        </div>
        <DataTable
          caption="Condition checks"
          columns={COLUMNS}
          rows={condition.checks}
          rowKey={(check) => check.code}
          rowTone={(check) => (check.answer === 'yes' ? undefined : 'attention')}
        />
      </div>
      <p className="sm mute mt-10">
        Worn clutches, seals and bearings are expected in a core and are no fault here.
      </p>
    </Section>
  );
}
