// Which kind of unit is shown, with how many there are of each.
import { KIND_WORDS, UNIT_KINDS, type UnitKind } from '../../shared/catalogue/kinds';
import { Segment } from '../ui/form/segment';

interface KindFilterProps {
  readonly kind: UnitKind | null;
  readonly counts: Readonly<Record<UnitKind, number>>;
  readonly total: number;
  readonly onChange: (kind: UnitKind | null) => void;
}

const ALL = 'all';

export function KindFilter({ kind, counts, total, onChange }: KindFilterProps) {
  return (
    <div className="catalogue-kinds">
      <Segment
        legend="Kind of unit"
        tight
        value={kind ?? ALL}
        options={[
          { value: ALL, label: 'All', note: total },
          ...UNIT_KINDS.map((one) => ({ value: one, label: KIND_WORDS[one].many, note: counts[one] })),
        ]}
        onChange={(value) => onChange(UNIT_KINDS.find((one) => one === value) ?? null)}
      />
    </div>
  );
}
