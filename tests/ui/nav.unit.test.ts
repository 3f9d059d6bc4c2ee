import { describe, expect, it } from 'vitest';
import { paths } from '../../src/paths';
import { navCells, navRole } from '../../src/shell/nav';

const current = (role: Parameters<typeof navCells>[0], pathname: string) =>
  navCells(role, pathname, {})
    .filter((cell) => cell.current)
    .map((cell) => cell.label);

describe('navigation', () => {
  it('when a page lies under two sections, then only the nearer one is current', () => {
    expect(current('yard', paths.yard.to())).toEqual(['Today']);
    expect(current('yard', paths.receive.to({ orderId: 'ord_1' }))).toEqual(['Receive']);
    expect(current('yard', paths.yardListing.to({ id: 'lst_1' }))).toEqual(['Stock']);
    expect(current('builder', paths.bookReturn.to({ id: 'ord_1' }))).toEqual(['Orders']);
  });

  it('when a page belongs to no section, then none is current', () => {
    expect(current('builder', paths.home.to())).toEqual([]);
    expect(current('builder', '/unitsandmore')).toEqual([]);
  });

  it('when a person has several desks, then the header follows the desk they are at', () => {
    const both = { isAdmin: true, isMember: true };
    expect(navRole(paths.yardStock.to(), both)).toBe('yard');
    expect(navRole(paths.adminLedger.to(), both)).toBe('admin');
    expect(navRole(paths.results.to(), both)).toBe('builder');
  });

  it('when somebody has no desk, then an address of a desk does not give them its header', () => {
    expect(navRole(paths.adminLedger.to(), { isAdmin: false, isMember: false })).toBe('builder');
    expect(navRole(paths.yard.to(), null)).toBe('visitor');
  });

  it('when work waits, then its cell carries the count', () => {
    const cells = navCells('yard', paths.yard.to(), { receiving: 3 });
    expect(cells.find((cell) => cell.label === 'Receive')?.count).toBe(3);
    expect(cells.find((cell) => cell.label === 'Stock')?.count).toBe(0);
  });
});
