import { describe, expect, it } from 'vitest';
import { paths, safeNext } from '../../src/paths';

describe('paths', () => {
  it('when an address has a parameter, then the link carries it, encoded', () => {
    expect(paths.order.to({ id: 'ord_1' })).toBe('/orders/ord_1');
    expect(paths.tag.to({ tag: '66A 22/07' })).toBe('/t/66A%2022%2F07');
    expect(paths.receive.to({ orderId: 'ord_2' })).toBe('/yard/receiving/ord_2');
  });

  it('when a query has empty values, then they are left out', () => {
    expect(paths.results.to()).toBe('/units');
    expect(paths.results.to({ q: 'K66A 4X', grade: '', rigId: undefined, maxCents: 150_000 })).toBe(
      '/units?q=K66A+4X&maxCents=150000',
    );
    expect(paths.listing.to({ id: 'lst_1' }, { rigId: 'rig_1' })).toBe('/units/lst_1?rigId=rig_1');
  });

  it('when two pages have an address, then no two have the same', () => {
    const patterns = Object.values(paths).map((one) => one.pattern);
    expect(new Set(patterns).size).toBe(patterns.length);
  });

  it('when somebody comes back from signing in, then only an address of this site is followed', () => {
    expect(safeNext('/orders/ord_1?tab=log')).toBe('/orders/ord_1?tab=log');
    for (const away of [
      null,
      '',
      'orders',
      '//evil.example',
      '/\\evil.example',
      'https://evil.example',
      'javascript:alert(1)',
    ]) {
      expect(safeNext(away)).toBe('/');
    }
  });
});
