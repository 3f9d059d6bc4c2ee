// The dialog of each action of the flow table that is taken on the order's page.
import type { ComponentType } from 'react';
import type { PersonAction } from '../../../shared/orders/actions';
import type { Order } from '../../../shared/orders/contract';
import type { ActionProps } from './action-props';
import { HandOverDialog } from './hand-over-dialog';
import { ContestDialog, RefuseDialog } from './object-dialog';
import { PackDialog } from './pack-dialog';
import {
  AbandonDialog,
  AcceptDialog,
  AgreeDialog,
  AllowOtherCoreDialog,
  DeliverDialog,
  KeepUnitDialog,
  ReceiveDialog,
} from './plain-actions';
import { CancelDialog, ExtendDialog } from './seller-dialogs';
import { SendDialog } from './send-dialog';

/** Booking a return and grading a core have pages of their own. */
type DialogAction = Exclude<PersonAction, 'book_return' | 'grade'>;

const DIALOGS: Readonly<Record<DialogAction, ComponentType<ActionProps>>> = {
  abandon: AbandonDialog,
  cancel: CancelDialog,
  pack: PackDialog,
  hand_over: HandOverDialog,
  deliver: DeliverDialog,
  accept: AcceptDialog,
  refuse: RefuseDialog,
  allow_other_core: AllowOtherCoreDialog,
  send: SendDialog,
  extend: ExtendDialog,
  keep_unit: KeepUnitDialog,
  receive: ReceiveDialog,
  agree: AgreeDialog,
  contest: ContestDialog,
};

interface ActionDialogProps {
  readonly order: Order;
  readonly action: PersonAction | null;
  readonly onClose: () => void;
}

export function ActionDialog({ order, action, onClose }: ActionDialogProps) {
  if (action === null || action === 'book_return' || action === 'grade') return null;
  const Chosen = DIALOGS[action];
  return <Chosen key={action} order={order} onClose={onClose} />;
}
