// The next panel of an order: what to do now, how long there is, one red button, and what else may be done.
import { CreditCard, Flag, ImagePlus, PackageCheck, Truck, type LucideIcon } from 'lucide-react';
import { useState } from 'react';
import type { PersonAction } from '../../shared/orders/actions';
import type { Order } from '../../shared/orders/contract';
import { paths } from '../paths';
import { Button, ButtonAnchor, ButtonLink, type ButtonLook } from '../ui/button';
import { DueBy } from '../ui/due-chip';
import { errorWords } from '../ui/error-state';
import { NextPanel } from '../ui/next-panel';
import { sayStop } from '../ui/notices';
import { ActionDialog } from './actions/action-dialogs';
import { useOpenCheckout } from './api';
import { Cautions } from './cautions';
import { nextOf, silenceOf, type NextButton, type NextMove } from './view/next-step';

const ICONS: Readonly<Partial<Record<PersonAction, LucideIcon>>> = {
  pack: PackageCheck,
  hand_over: Truck,
  send: Truck,
  book_return: Truck,
  grade: PackageCheck,
  receive: PackageCheck,
  refuse: Flag,
  contest: Flag,
};

function iconOf(move: NextMove): LucideIcon | undefined {
  switch (move.kind) {
    case 'pay':
      return CreditCard;
    case 'case':
      return ImagePlus;
    case 'action':
      return ICONS[move.action];
    default:
      return ICONS[move.kind];
  }
}

interface MoveButtonProps {
  readonly order: Order;
  readonly button: NextButton;
  readonly look: ButtonLook;
  readonly onAction: (action: PersonAction) => void;
}

function PayButton({ order, button, look }: Omit<MoveButtonProps, 'onAction'>) {
  const open = useOpenCheckout(order.id);
  const pay = () =>
    open.mutate(undefined, {
      onSuccess: ({ checkoutUrl }) => window.location.assign(checkoutUrl),
      onError: (error) => sayStop(errorWords(error).detail),
    });
  return (
    <Button
      {...look}
      busy={open.isPending || open.isSuccess}
      busyWords="Opening the payment page"
      onClick={pay}
    >
      {button.label}
    </Button>
  );
}

/** A button where something happens here, a link where it happens on another page. */
function MoveButton({ order, button, look, onAction }: MoveButtonProps) {
  const { move } = button;
  const icon = iconOf(move);
  const drawn = { ...look, full: true, ...(icon ? { icon } : {}) };
  switch (move.kind) {
    case 'pay':
      return <PayButton order={order} button={button} look={drawn} />;
    case 'book_return':
      return (
        <ButtonLink {...drawn} to={paths.bookReturn.to({ id: order.id })}>
          {button.label}
        </ButtonLink>
      );
    case 'grade':
      return (
        <ButtonLink {...drawn} to={paths.receive.to({ orderId: order.id })}>
          {button.label}
        </ButtonLink>
      );
    case 'case':
      return (
        <ButtonLink {...drawn} to={paths.case.to({ id: move.caseId })}>
          {button.label}
        </ButtonLink>
      );
    case 'action':
      return (
        <Button {...drawn} onClick={() => onAction(move.action)}>
          {button.label}
        </Button>
      );
  }
}

/** The tag to print belongs to what is done next: wired to the unit before it ships, to the core before it is sent. */
function paperOf(order: Order): Order['documents'][number] | undefined {
  const name = order.role === 'builder' ? 'return-tag.pdf' : 'packing-tag.pdf';
  const wanted =
    order.role === 'builder'
      ? order.core?.state === 'booked'
      : order.outbound.state === 'paid' || order.outbound.state === 'packed';
  return wanted ? order.documents.find((one) => one.name === name) : undefined;
}

function PickupCode({ order }: { readonly order: Order }) {
  const { pickupCode, state } = order.outbound;
  if (!pickupCode || (state !== 'paid' && state !== 'packed')) return null;
  return (
    <p>
      Pickup code <strong className="code text-money-22">{pickupCode}</strong>
      <span className="sm mute block">Show it at the yard when you have looked the unit over.</span>
    </p>
  );
}

interface NextStepProps {
  readonly order: Order;
  /** The server's time. */
  readonly now: string;
}

export function NextStep({ order, now }: NextStepProps) {
  const [action, setAction] = useState<PersonAction | null>(null);
  const view = nextOf(order);
  const paper = paperOf(order);
  const silence = view.clock ? silenceOf(order) : null;
  const clock = view.clock && !view.clock.short ? { ...view.clock, now, zone: order.zone } : undefined;
  return (
    <>
      <NextPanel
        title={view.title}
        {...(clock ? { clock } : {})}
        steps={view.steps}
        actions={
          <>
            {view.red && (
              <MoveButton
                order={order}
                button={view.red}
                look={{ look: 'go', size: 'big' }}
                onAction={setAction}
              />
            )}
            {paper && (
              <ButtonAnchor full href={paper.url} target="_blank" rel="noreferrer">
                Print the {paper.label.toLowerCase()}
              </ButtonAnchor>
            )}
            {view.plain.map((button) => (
              <MoveButton key={button.label} order={order} button={button} look={{}} onAction={setAction} />
            ))}
          </>
        }
      >
        {view.clock?.short && <DueBy {...view.clock} now={now} soonHours={1} />}
        {view.waiting && <p>{view.waiting}</p>}
        <PickupCode order={order} />
        <Cautions lines={view.cautions} />
        {silence && <p className="xs mute">{silence}</p>}
      </NextPanel>
      <ActionDialog order={order} action={action} onClose={() => setAction(null)} />
    </>
  );
}
