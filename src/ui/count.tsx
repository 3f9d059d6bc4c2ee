// A number large enough to be read across a yard: days left, days off the road.
import clsx from 'clsx';

export function Count({ value, big = false }: { readonly value: number | string; readonly big?: boolean }) {
  return <b className={clsx('count', big && 'count-big')}>{value}</b>;
}
