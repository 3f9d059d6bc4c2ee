// Open deposits by the week the core is due, measured on a steel rule; on a phone the bars lie down as a list.
import { formatCents } from '../../../shared/kernel/money';
import { formatShortDay } from '../../ui/dates';
import type { DepositWeek } from '../view/deposit-weeks';

const HEIGHT = 210;
const BASE = 236;
const LEFT = 74;
const BAR = 46;
const GAP = 23;
const FIRST = 14;

/** "$1,800": the axis and bars have no room for cents, the list and the figure above do. */
const dollars = (cents: number): string => `$${Math.round(cents / 100).toLocaleString('en-US')}`;

const weekName = (week: DepositWeek): string =>
  week.monday === null ? 'No date' : formatShortDay(`${week.monday}T12:00:00Z`, 'UTC').replace(/^\w+ /, '');

/** A top of the scale with five round steps under it. */
function scaleOf(weeks: readonly DepositWeek[]): { readonly topDollars: number; readonly step: number } {
  const most = Math.max(1, ...weeks.map((week) => week.totalCents)) / 100;
  const raw = most / 5;
  const power = 10 ** Math.floor(Math.log10(raw));
  const step = [1, 2, 2.5, 5, 10].map((one) => one * power).find((one) => one >= raw) ?? 10 * power;
  return { topDollars: step * 5, step };
}

interface Part {
  readonly key: string;
  readonly cents: number;
  readonly className: string;
}

const partsOf = (week: DepositWeek): Part[] =>
  [
    { key: 'late', cents: week.lateCents, className: 'chart-late' },
    { key: 'moving', cents: week.movingCents, className: 'chart-moving' },
    { key: 'builder', cents: week.withBuilderCents, className: 'chart-builder' },
  ].filter((part) => part.cents > 0);

function Axis({ step }: { readonly step: number }) {
  const ticks = Array.from({ length: 26 }, (_, index) => index);
  return (
    <>
      <path className="chart-axis" d={`M${LEFT - 8} ${BASE - HEIGHT}V${BASE}`} />
      {ticks.map((tick) => {
        const y = BASE - (tick / 25) * HEIGHT;
        const long = tick % 5 === 0;
        return (
          <g key={tick}>
            <path className="chart-tick" d={`M${LEFT - 8 - (long ? 14 : 6)} ${y}H${LEFT - 8}`} />
            {long && (
              <text className="chart-mute" x={LEFT - 26} y={y + 4.5} textAnchor="end">
                {dollars((tick / 5) * step * 100)}
              </text>
            )}
          </g>
        );
      })}
    </>
  );
}

function Bar({ week, index, topDollars }: { week: DepositWeek; index: number; topDollars: number }) {
  const x = LEFT + FIRST + index * (BAR + GAP);
  const heightOf = (cents: number) => (cents / 100 / topDollars) * HEIGHT;
  const tops = partsOf(week).reduce<{ part: Part; y: number; height: number }[]>((done, part) => {
    const under = done.at(-1)?.y ?? BASE;
    const height = heightOf(part.cents);
    return [...done, { part, y: under - height, height }];
  }, []);
  return (
    <>
      {tops.map(({ part, y, height }) => (
        <rect key={part.key} className={part.className} x={x} y={y} width={BAR} height={height} />
      ))}
      <text x={x + BAR / 2} y={(tops.at(-1)?.y ?? BASE) - 8} textAnchor="middle">
        {dollars(week.totalCents)}
      </text>
      <text className="chart-mute" x={x + BAR / 2} y={BASE + 20} textAnchor="middle">
        {weekName(week)}
      </text>
    </>
  );
}

const spoken = (weeks: readonly DepositWeek[]): string =>
  weeks
    .map((week) => {
      const late = week.lateCents > 0 ? `, of which ${formatCents(week.lateCents)} late` : '';
      return `${week.monday === null ? 'Without a date' : `Week of ${weekName(week)}`} ${formatCents(week.totalCents)}${late}`;
    })
    .join('. ');

export function DepositChart({ weeks }: { readonly weeks: readonly DepositWeek[] }) {
  const { topDollars, step } = scaleOf(weeks);
  const width = LEFT + FIRST + weeks.length * (BAR + GAP) + 8;
  const most = Math.max(1, ...weeks.map((week) => week.totalCents));
  return (
    <>
      <svg
        className="deposit-chart"
        viewBox={`0 0 ${Math.max(510, width)} 264`}
        role="img"
        aria-label={`Deposits still open by the week the core is due. ${spoken(weeks)}.`}
      >
        <defs>
          <pattern
            id="chart-hatch"
            width="7"
            height="7"
            patternUnits="userSpaceOnUse"
            patternTransform="rotate(45)"
          >
            <rect width="7" height="7" fill="var(--red-soft)" />
            <path d="M0 0V7" stroke="var(--red)" strokeWidth="3.4" />
          </pattern>
        </defs>
        <Axis step={step} />
        {weeks.map((week, index) => (
          <Bar key={week.monday ?? 'none'} week={week} index={index} topDollars={topDollars} />
        ))}
        <path className="chart-axis" d={`M${LEFT - 8} ${BASE}H${width}`} />
      </svg>
      <ul className="deposit-bars">
        {weeks.map((week) => (
          <li key={week.monday ?? 'none'}>
            <span>{weekName(week)}</span>
            <span className="deposit-track" aria-hidden="true">
              {partsOf(week).map((part) => (
                <i
                  key={part.key}
                  className={part.className}
                  style={{ width: `${(part.cents / most) * 100}%` }}
                />
              ))}
            </span>
            <b className="num">{formatCents(week.totalCents)}</b>
          </li>
        ))}
      </ul>
    </>
  );
}
