// Booking the core return: which unit goes back, its code, its nine shots; then the tag to print.
import { useQuery } from '@tanstack/react-query';
import { Printer } from 'lucide-react';
import { ACTION_INPUT } from '../../shared/orders/actions';
import { actionEndpoints, type Order } from '../../shared/orders/contract';
import { OLD_UNIT_PHOTOS_MIN } from '../../shared/orders/guards';
import { formatCents } from '../../shared/kernel/money';
import type { ListingPage } from '../../shared/listings/page';
import { paths } from '../paths';
import { Button, ButtonAnchor, ButtonLink } from '../ui/button';
import { formatDay } from '../ui/dates';
import { Form, useZodForm } from '../ui/form/form';
import { RadioGroup } from '../ui/form/radio-group';
import { TextArea } from '../ui/form/text-area';
import { TextInput } from '../ui/form/text-input';
import { Panel, Section } from '../ui/sheet';
import { useOrderAction } from './api';
import { Cautions } from './cautions';
import { CodeReading } from './code-reading';
import { photosFor } from './photos/order-photos';
import { ShotShelf } from './photos/shot-shelf';
import { returnShots } from './return-shots';
import { unitQuery } from './unit-api';
import { CAUTIONS } from './view/next-step';

/** The tag of a booked return, and what to do with it. */
export function ReturnBooked({ order }: { readonly order: Order }) {
  const tag = order.documents.find((one) => one.name === 'return-tag.pdf');
  return (
    <Panel label="Booked" className="panel-body">
      <h2>Booked. Wire the tag to an ear</h2>
      <ol className="next-steps">
        <li>Print the tag, cover it against the wet.</li>
        <li>Strap the core to the pallet, lines plugged.</li>
        <li>Send it by {order.core?.dueAt ? formatDay(order.core.dueAt, order.zone) : 'the due date'}.</li>
      </ol>
      <Cautions lines={CAUTIONS.send ?? []} />
      <div className="next-actions">
        {tag && (
          <ButtonAnchor
            look="go"
            size="big"
            full
            icon={Printer}
            href={tag.url}
            target="_blank"
            rel="noreferrer"
          >
            Print the core tag
          </ButtonAnchor>
        )}
        <ButtonLink full to={paths.order.to({ id: order.id })}>
          Back to the order
        </ButtonLink>
      </div>
    </Panel>
  );
}

/** Where a stamp can't be read whole the builder says which unit it is. */
function WhichUnit({ unit, register }: { readonly unit: ListingPage; readonly register: object }) {
  return (
    <RadioGroup
      legend="If the stamp can’t be read whole"
      hint="The yard looks at it and may disagree."
      options={[
        { value: '', label: 'The code says it' },
        { value: unit.variantId, label: `It is the same inside as the unit you bought: ${unit.family.name}` },
      ]}
      {...register}
    />
  );
}

export function BookReturnForm({ order }: { readonly order: Order }) {
  const unit = useQuery(unitQuery(order.listingId)).data ?? null;
  const action = useOrderAction(actionEndpoints.book_return, order.id);
  const form = useZodForm(ACTION_INPUT.book_return, {
    version: order.version,
    caseCode: '',
    variantId: '',
  });
  const { errors } = form.formState;
  const taken = photosFor(order, 'core').length;
  return (
    <Form
      form={form}
      stops="this booking"
      onSubmit={async ({ variantId, ...values }) => {
        await action.mutateAsync({ ...values, ...(variantId ? { variantId } : {}) });
        window.scrollTo({ top: 0 });
      }}
      className="grid gap-28"
    >
      <Cautions lines={CAUTIONS.book_return ?? []} />
      <div className="grid gap-14 max-w-read">
        <TextInput
          code
          label="Case code of the old unit"
          hint="As stamped. Put ? for a letter you can’t make out."
          error={errors.caseCode?.message}
          {...form.register('caseCode')}
        />
        <CodeReading text={form.watch('caseCode')} kind={unit?.kind ?? null} />
        {unit && <WhichUnit unit={unit} register={form.register('variantId')} />}
        {!order.core?.otherCoreAllowed && (
          <p className="sm mute">
            A unit with other internals needs {order.sellerName}’s yes first. Ask on the order page.
          </p>
        )}
      </div>
      <Section
        title="Nine shots of the old unit"
        note={`${taken} taken, ${OLD_UNIT_PHOTOS_MIN} needed, all nine are better proof`}
      >
        <ShotShelf order={order} purpose="core" shots={returnShots(unit?.kind ?? null)} />
      </Section>
      <TextArea
        label="Note for the yard"
        optional
        rows={2}
        error={errors.note?.message}
        {...form.register('note')}
      />
      <div className="grid gap-10 max-w-read">
        <Button type="submit" look="go" size="big" busy={form.formState.isSubmitting} busyWords="Booking it">
          Book the return, {formatCents(order.money.heldCoreCents)} waits
        </Button>
        <p className="sm mute">
          {order.returnFreight === 'seller' ? `${order.sellerName} pays` : 'You pay'} the return freight, as
          in the terms you bought under.
        </p>
      </div>
    </Form>
  );
}
