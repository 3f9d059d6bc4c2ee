// Events, to be listed and read again by whoever missed one.
import { z } from 'zod';
import { missing } from '../errors';
import { readParams } from '../form-decode';
import { listParams, pageOf } from '../lists';
import type { ProviderEvent } from '../model/delivery';
import { idOf, type Routes } from '../router';
import { renderEvent } from '../webhook-attempt';
import type { World } from '../world';

const eventListParams = z.strictObject({
  ...listParams,
  type: z.string().optional(),
  types: z.array(z.string()).max(20).optional(),
});

function shown(world: World, event: ProviderEvent): object {
  const waiting = world.state.deliveries
    .all()
    .some((delivery) => delivery.eventId === event.id && delivery.deliveredAtMs === null);
  return renderEvent(event, waiting);
}

export const eventRoutes: Routes = {
  'GET /v1/events': ({ world, form, path }) => {
    const { type, types, ...paging } = readParams(eventListParams, form);
    const events = world.state.events
      .all()
      .filter((event) => type === undefined || event.type === type)
      .filter((event) => types === undefined || types.includes(event.type));
    const found = pageOf(events, paging, path);
    return { ...found, data: found.data.map((event) => shown(world, event)) };
  },
  'GET /v1/events/:id': (call) => {
    const event = call.world.state.events.get(idOf(call));
    if (event === undefined) throw missing('event', idOf(call));
    return shown(call.world, event);
  },
};
