// Payment intents and charges: what a completed checkout has left, to be read.
import { z } from 'zod';
import { missing } from '../errors';
import { expandParam, metadata, readParams } from '../form-decode';
import { listParams, pageOf } from '../lists';
import { idOf, type Routes } from '../router';

const readOnly = z.strictObject({ expand: expandParam });
const chargeListParams = z.strictObject({
  ...listParams,
  payment_intent: z.string().optional(),
  transfer_group: z.string().optional(),
});
const updateParams = z.strictObject({ metadata: metadata.default({}), expand: expandParam });

export const paymentRoutes: Routes = {
  'GET /v1/payment_intents': ({ world, form, path }) =>
    pageOf(world.state.paymentIntents.all(), readParams(z.strictObject(listParams), form), path),
  'GET /v1/payment_intents/:id': (call) => {
    readParams(readOnly, call.form);
    const intent = call.world.state.paymentIntents.get(idOf(call));
    if (intent === undefined) throw missing('payment_intent', idOf(call), 'intent');
    return intent;
  },
  'GET /v1/charges': ({ world, form, path }) => {
    const { payment_intent: intent, transfer_group: group, ...paging } = readParams(chargeListParams, form);
    const charges = world.state.charges
      .all()
      .filter((charge) => intent === undefined || charge.payment_intent === intent)
      .filter((charge) => group === undefined || charge.transfer_group === group);
    return pageOf(charges, paging, path);
  },
  'GET /v1/charges/:id': (call) => {
    readParams(readOnly, call.form);
    const charge = call.world.state.charges.get(idOf(call));
    if (charge === undefined) throw missing('charge', idOf(call));
    return charge;
  },
  'POST /v1/charges/:id': (call) => {
    const params = readParams(updateParams, call.form);
    const charge = call.world.state.charges.get(idOf(call));
    if (charge === undefined) throw missing('charge', idOf(call));
    return call.world.state.charges.put(charge.id, {
      ...charge,
      metadata: { ...charge.metadata, ...params.metadata },
    });
  },
};
