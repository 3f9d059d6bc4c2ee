// Test cards and what becomes of them; anything that is not a test card is refused, so that no real card is ever used.

export interface Card {
  readonly number: string;
  readonly expMonth: number;
  readonly expYear: number;
  readonly cvc: string;
}

export interface Decline {
  readonly code: string;
  readonly declineCode?: string;
  readonly message: string;
  /** Which field of the page is to be looked at. */
  readonly field: 'number' | 'expiry' | 'cvc';
}

/** The card that pays, for calls that give a number alone. */
export const GOOD_CARD = '4242424242424242';

const declined = (declineCode: string, message: string): Decline => ({
  code: 'card_declined',
  declineCode,
  message,
  field: 'number',
});

const OUTCOMES: Readonly<Record<string, Decline | null>> = {
  [GOOD_CARD]: null,
  '4000000000000002': declined('generic_decline', 'Your card was declined.'),
  '4000000000009995': declined('insufficient_funds', 'Your card has insufficient funds.'),
  '4000000000000069': { code: 'expired_card', message: 'Your card has expired.', field: 'expiry' },
  '4000000000000127': {
    code: 'incorrect_cvc',
    message: "Your card's security code is incorrect.",
    field: 'cvc',
  },
};

/** The check digit of ISO/IEC 7812-1, Annex B. */
export function hasCheckDigit(number: string): boolean {
  let sum = 0;
  for (const [index, digit] of Array.from(number).reverse().entries()) {
    const doubled = index % 2 === 1 ? Number(digit) * 2 : Number(digit);
    sum += doubled > 9 ? doubled - 9 : doubled;
  }
  return number.length > 0 && sum % 10 === 0;
}

/** Null when the card is accepted. */
export function judgeCard(card: Card, now: Date): Decline | null {
  if (!/^\d{13,19}$/.test(card.number) || !hasCheckDigit(card.number))
    return { code: 'incorrect_number', message: 'Your card number is not valid.', field: 'number' };
  if (!(card.expMonth >= 1 && card.expMonth <= 12))
    return {
      code: 'invalid_expiry_month',
      message: "Your card's expiration month is not valid.",
      field: 'expiry',
    };
  const lastMonth = now.getUTCFullYear() * 12 + now.getUTCMonth();
  if (card.expYear * 12 + card.expMonth - 1 < lastMonth)
    return { code: 'expired_card', message: 'Your card has expired.', field: 'expiry' };
  if (!/^\d{3,4}$/.test(card.cvc))
    return { code: 'invalid_cvc', message: "Your card's security code is not valid.", field: 'cvc' };
  const outcome = OUTCOMES[card.number];
  if (outcome === undefined)
    return declined('test_mode_live_card', 'Only test cards work here. Use 4242 4242 4242 4242.');
  return outcome;
}
