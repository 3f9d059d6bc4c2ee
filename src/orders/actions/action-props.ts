// What the dialog of each action is given.
import type { Order } from '../../../shared/orders/contract';

export interface ActionProps {
  readonly order: Order;
  readonly onClose: () => void;
}
