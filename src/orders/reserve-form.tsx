// The buy panel of a listing: exchange or outright, freight or pickup, where to, what it costs today and after the core is back.
import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { Cents } from '../../shared/kernel/money';
import { ProblemError } from '../http/client';
import { paths } from '../paths';
import { Button } from '../ui/button';
import { Form, useZodForm } from '../ui/form/form';
import { Segment } from '../ui/form/segment';
import { StopBox } from '../ui/stop-box';
import { useReserve } from './api';
import { AddressFields, reserveBody, type ReserveInput } from './reserve-address';
import { ReserveCost } from './reserve-cost';

/** What the panel needs of a listing. */
export interface ReserveListing {
  readonly listingId: string;
  readonly exchange: {
    readonly priceCents: Cents;
    readonly depositCents: Cents;
    readonly windowDays: number;
    /** Who pays for the old unit's way back. */
    readonly returnFreight: 'seller' | 'builder';
  } | null;
  readonly outrightCents: Cents | null;
  /** The quote to the ZIP code last asked for; null without one. */
  readonly freight: {
    readonly toZip: string;
    readonly cents: Cents;
    readonly miles: number;
    readonly daysLow: number;
    readonly daysHigh: number;
  } | null;
  readonly sellerName: string;
  /** "Boise, ID": where it is collected. */
  readonly sellerPlace: string;
  /** IANA zone of the seller: deadlines are counted there. */
  readonly zone: string;
}

interface ReserveFormProps {
  readonly listing: ReserveListing;
  /** Five digits were typed: the page asks for the freight quote to there. */
  readonly onZip: (zip: string) => void;
}

const TERMS = [
  { value: 'exchange', label: 'Exchange', note: 'your core comes back' },
  { value: 'outright', label: 'Outright', note: 'you keep your core' },
] as const;

const METHODS = [
  { value: 'freight', label: 'Freight' },
  { value: 'pickup', label: 'I collect it' },
] as const;

function startOf(listing: ReserveListing): ReserveInput {
  return {
    listingId: listing.listingId,
    terms: listing.exchange ? 'exchange' : 'outright',
    delivery: {
      method: 'freight',
      name: '',
      line1: '',
      city: '',
      region: '',
      zip: listing.freight?.toZip ?? '',
    },
  };
}

function SignInFirst() {
  return (
    <StopBox title="Sign in to buy" announce>
      <p>
        <Link to={paths.signIn.to({ next: window.location.pathname + window.location.search })}>Sign in</Link>
        , and you come back to this unit.
      </p>
    </StopBox>
  );
}

const isSignedOut = (error: unknown): boolean =>
  error instanceof ProblemError && error.problem.status === 401;

export function ReserveForm({ listing, onZip }: ReserveFormProps) {
  const form = useZodForm(reserveBody, startOf(listing));
  const reserve = useReserve();
  const [signedOut, setSignedOut] = useState(false);
  const terms = form.watch('terms');
  const method = form.watch('delivery.method');
  const zip = form.watch('delivery.zip');
  async function buy(values: ReserveInput) {
    setSignedOut(false);
    try {
      const { order, checkoutUrl } = await reserve.mutateAsync(values);
      window.location.assign(checkoutUrl ?? paths.order.to({ id: order.id }));
    } catch (error) {
      if (!isSignedOut(error)) throw error;
      setSignedOut(true);
    }
  }
  return (
    <Form form={form} onSubmit={buy} stops="this order" label="Buy this unit" className="grid gap-18">
      {signedOut && <SignInFirst />}
      {listing.exchange && listing.outrightCents !== null && (
        <Segment
          legend="How you buy"
          options={TERMS}
          value={terms}
          onChange={(value) => form.setValue('terms', value)}
        />
      )}
      <Segment
        legend="How it gets to you"
        legendShown
        options={METHODS}
        value={method}
        onChange={(value) => form.setValue('delivery.method', value)}
      />
      <AddressFields form={form} method={method} sellerPlace={listing.sellerPlace} onZip={onZip} />
      <ReserveCost listing={listing} terms={terms} method={method} zip={zip} />
      <Button
        type="submit"
        look="go"
        size="big"
        full
        busy={form.formState.isSubmitting}
        busyWords="Holding the unit for you"
      >
        {terms === 'exchange' ? 'Buy for exchange' : 'Buy outright'}
      </Button>
      <p className="xs mute">
        Next is the payment page. The unit is held for you for 30 minutes; nothing is taken before you pay
        there. It is a used unit: look it over within five business days of delivery.
      </p>
    </Form>
  );
}
