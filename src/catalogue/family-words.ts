// How a family is said in words: speeds, ratios, members of its gears.
import type { FamilySummary } from '../../shared/catalogue/contract';
import type { Family } from '../../shared/catalogue/family';
import { KIND_WORDS } from '../../shared/catalogue/kinds';

const NUMBERS = ['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six', 'Seven', 'Eight', 'Nine', 'Ten'];

type Named = Pick<FamilySummary, 'kind' | 'forwardRatios' | 'lowRange'>;

/** "Six-speed automatic", "Two-speed transfer case", "Axle, four ratios". */
export function unitWords({ kind, forwardRatios, lowRange }: Named): string {
  const count = NUMBERS[forwardRatios.length] ?? String(forwardRatios.length);
  if (kind === 'axle') return `Axle, ${count.toLowerCase()} ratios`;
  if (kind === 'transfer_case') return `${lowRange === null ? 'One' : 'Two'}-speed ${KIND_WORDS[kind].one}`;
  return `${count}-speed ${KIND_WORDS[kind].one}`;
}

/** "2.45", "−2.20": two places, a true minus. */
export const ratioWords = (ratio: number): string => ratio.toFixed(2).replace('-', '−');

/** All ratios in a line: what a builder compares first. */
export function ratiosLine({ forwardRatios, lowRange, kind }: Named): string {
  if (kind === 'transfer_case') return lowRange === null ? 'No low range' : `Low ${ratioWords(lowRange)}`;
  return forwardRatios.map(ratioWords).join('  ');
}

export const CONTROL_WORDS: Readonly<Record<Family['control'], string>> = {
  hydraulic: 'Hydraulic',
  electronic: 'Electronic',
  none: 'By hand',
};

const SET_WORDS: Readonly<Record<string, string>> = { od: 'overdrive', main: '', low: '' };
const PART_WORDS: Readonly<Record<string, string>> = { smallSun: 'small sun', largeSun: 'large sun' };

export const setWords = (name: string): string => SET_WORDS[name] ?? name;

/** 'front.smallSun' as "front small sun". */
export function memberWords(member: string): string {
  const [set = '', part = ''] = member.split('.');
  return `${setWords(set)} ${PART_WORDS[part] ?? part}`.trim();
}

const MM_PER_INCH = 25.4;
export const inches = (mm: number): string => `${(mm / MM_PER_INCH).toFixed(1)} in`;
