// How a returned core was graded: the grade, each deduction with its photo and the line of the terms, and the sums.
import { useState } from 'react';
import type { Order } from '../../shared/orders/contract';
import { formatCents } from '../../shared/kernel/money';
import { GradeSquare } from '../ui/grade-square';
import { MoneyLines } from '../ui/money-lines';
import { PhotoBox, type Photo } from '../ui/photo-box';
import { Section, Sheet } from '../ui/sheet';
import { ShotTile } from '../ui/shot-tile';
import { dayIn } from './view/moments';
import { builderTo, sellerTo } from './view/sides';

type Core = NonNullable<Order['core']>;

const boxPhotos = (order: Order, core: Core): Photo[] =>
  core.deductions.map((one) => ({
    src: one.photoUrl,
    alt: `${one.label}: ${order.title}, as received`,
    label: one.label,
    ...(one.note ? { note: one.note } : {}),
  }));

export function GradeResult({ order }: { readonly order: Order }) {
  const [open, setOpen] = useState<number | null>(null);
  const { core } = order;
  if (!core?.grade) return null;
  const { toBuilderCents, toSellerCents } = core;
  return (
    <Section title={`Graded ${core.grade}`} note={dayIn(order, core.gradedAt)}>
      <Sheet pad>
        <div className="grid gap-20 desk:grid-cols-2">
          <div className="flex items-start gap-18">
            <GradeSquare grade={core.grade} size="desk" />
            <div>
              <p className="lead">
                {core.deductions.length === 0
                  ? 'Nothing was taken off.'
                  : `${core.deductions.length} ${core.deductions.length === 1 ? 'deduction' : 'deductions'} of the terms, each with its photo.`}
              </p>
              {core.sentLate && <p className="warn mt-6">Sent after the due date.</p>}
            </div>
          </div>
          <MoneyLines
            lines={[
              { label: 'Deposit', cents: order.money.depositCents },
              ...core.deductions.map((one) => ({
                label: one.label,
                cents: -one.cents,
                ...(one.note ? { note: one.note } : {}),
              })),
            ]}
            {...(toBuilderCents === null
              ? {}
              : { total: { label: `Back to ${builderTo(order)}`, cents: toBuilderCents } })}
          />
        </div>
        {toSellerCents !== null && toSellerCents > 0 && (
          <p className="sm mute mt-10">
            {formatCents(toSellerCents)} goes to {sellerTo(order)}.
          </p>
        )}
        {core.deductions.length > 0 && (
          <ul className="mt-18 grid grid-cols-2 gap-8 tablet:grid-cols-4">
            {core.deductions.map((one, index) => (
              <li key={one.code}>
                <ShotTile
                  number={index + 1}
                  label={one.label}
                  src={one.photoUrl}
                  alt={`${one.label}, as received`}
                  onPress={() => setOpen(index)}
                />
              </li>
            ))}
          </ul>
        )}
        <PhotoBox photos={boxPhotos(order, core)} index={open} onIndex={setOpen} />
      </Sheet>
    </Section>
  );
}
