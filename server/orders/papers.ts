// Which papers an order has by now.
import type { Order } from '../../shared/orders/contract';
import type { OrderRow } from './load';

export type PaperName = 'packing-tag.pdf' | 'return-tag.pdf' | 'bill-of-sale.pdf' | 'case-pack.pdf';

const LABELS: Readonly<Record<PaperName, string>> = {
  'packing-tag.pdf': 'Packing tag',
  'return-tag.pdf': 'Core return tag',
  'bill-of-sale.pdf': 'Bill of sale and return terms',
  'case-pack.pdf': 'Case papers',
};

export function papersOf(order: OrderRow, hasCase: boolean): PaperName[] {
  const names: PaperName[] = [];
  if (order.paidAt !== null) names.push('packing-tag.pdf', 'bill-of-sale.pdf');
  if (order.coreCaseCode !== null) names.push('return-tag.pdf');
  if (hasCase) names.push('case-pack.pdf');
  return names;
}

export const documentsOf = (order: OrderRow, hasCase: boolean): Order['documents'] =>
  papersOf(order, hasCase).map((name) => ({
    name,
    label: LABELS[name],
    url: `/api/orders/${order.id}/documents/${name}`,
  }));
