// What other features may use of the money: enter an event, read what is held.
export { holdsOf, postEntry } from './post';
export { moneyOf, type MoneyRow } from './order-money';
