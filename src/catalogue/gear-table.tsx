// Every gear of a unit: its ratio, the exact fraction, the drop to the next, and what makes it.
import type { Gears } from '../../shared/catalogue/gear-layout';
import { ratiosOf, type GearRatio } from '../../shared/gearing/family-ratios';
import { fractionText, toNumber } from '../../shared/gearing/fraction';
import { DataTable, type Column } from '../ui/data-table';
import { memberWords, ratioWords } from './family-words';

interface GearRow {
  readonly gear: string;
  readonly ratio: number | null;
  readonly exact: string;
  /** How far the engine drops when shifting up from the gear before. */
  readonly drop: number | null;
  readonly how: string;
}

const NAMES: Readonly<Record<string, string>> = { R: 'Reverse', H: 'High', L: 'Low' };

const list = (members: readonly string[]): string => members.map(memberWords).join(' and ');

/** What is done in a gear, in words: teeth for pairs, members for planetary sets. */
function howOf(gears: Gears, gear: string): string {
  switch (gears.type) {
    case 'planetary': {
      const step = gears.steps.find((one) => one.gear === gear);
      if (!step) return '';
      const parts = [
        `Drives ${list(step.drive)}`,
        step.hold.length > 0 ? `holds ${list(step.hold)}` : '',
        ...step.lock.map((pair) => `joins ${list(pair)}`),
      ];
      return parts.filter(Boolean).join(', ');
    }
    case 'countershaft': {
      if (gear === gears.direct) return 'Input and main shaft joined';
      const pair = gear === 'R' ? gears.reverse : gears.pairs.find((one) => one.gear === gear);
      const teeth = pair ? `${pair.counter} on the countershaft drive ${pair.main}` : '';
      const idler = gear === 'R' ? ` through an idler of ${gears.reverse.idler}` : '';
      return `${teeth}${idler}${gear === 'R' || gears.synchronised.includes(gear) ? '' : ', not synchronised'}`;
    }
    case 'planetary_low':
      return gear === 'H'
        ? 'Set turns as one'
        : `Ring ${gears.ring} held, sun ${gears.sun} drives the carrier`;
    case 'geared_low':
      return gear === 'H'
        ? 'Input and output joined'
        : `${gears.input} drives ${gears.idlerIn}, ${gears.idlerOut} drives ${gears.output}`;
    case 'chain_only':
      return 'No low range';
    case 'ring_and_pinion': {
      const pair = gears.pairs[Number(gear) - 1];
      return pair ? `Pinion of ${pair.pinion} drives a ring of ${pair.ring}` : '';
    }
  }
}

function rowsOf(gears: Gears): GearRow[] {
  const ratios = ratiosOf(gears);
  const valueOf = (one: GearRatio | undefined): number | null => (one?.ratio ? toNumber(one.ratio) : null);
  const shifts = gears.type === 'planetary' || gears.type === 'countershaft';
  return ratios.map((one, index) => {
    const ratio = valueOf(one);
    const before = shifts && one.gear !== 'R' ? valueOf(ratios[index - 1]) : null;
    return {
      gear: gears.type === 'ring_and_pinion' ? '' : (NAMES[one.gear] ?? one.gear),
      ratio,
      exact: one.ratio ? fractionText(one.ratio).replace('-', '−') : '',
      drop: before !== null && ratio !== null ? 1 - ratio / before : null,
      how: howOf(gears, one.gear),
    };
  });
}

const GEAR: Column<GearRow> = { head: 'Gear', phone: 'name', cell: (row) => row.gear };
const RATIO: Column<GearRow> = {
  head: 'Ratio',
  number: true,
  phone: 'amount',
  cell: (row) => (row.ratio === null ? 'Locks' : ratioWords(row.ratio)),
};
const REST: readonly Column<GearRow>[] = [
  { head: 'Exactly', number: true, phone: 'labelled', cell: (row) => row.exact },
  { head: 'What makes it', cell: (row) => row.how },
];
const DROP: Column<GearRow> = {
  head: 'Engine drops',
  number: true,
  phone: 'labelled',
  cell: (row) => (row.drop === null ? '' : `${Math.round(row.drop * 100)} %`),
};

export function GearTable({ gears }: { readonly gears: Gears }) {
  const shifts = gears.type === 'planetary' || gears.type === 'countershaft';
  const columns = [
    ...(gears.type === 'ring_and_pinion'
      ? [{ ...RATIO, number: false, phone: 'name' as const }]
      : [GEAR, RATIO]),
    ...REST,
    ...(shifts ? [DROP] : []),
  ];
  return (
    <DataTable
      caption="Gears with their ratios"
      columns={columns}
      rows={rowsOf(gears)}
      rowKey={(row) => `${row.gear} ${row.exact}`}
    />
  );
}
