// Every route of the product in one list: mounted by the app, described in OpenAPI, walked by the authorisation test.
import { accountRoutes } from './accounts/routes';
import { catalogueRoutes } from './catalogue/routes';
import type { Route } from './http/route';
import { listingPhotoParty } from './listings/for-others';
import { listingRoutes } from './listings/routes';
import { moneyRoutes } from './money/routes';
import { orderPhotoParty, trackRecordOf } from './orders/for-others';
import { orderRoutes } from './orders/routes';
import { photoRoutes } from './photos/routes';
import { readingRoutes } from './reading/routes';
import { systemRoutes } from './system/routes';

export const allRoutes: readonly Route[] = [
  ...systemRoutes,
  ...accountRoutes,
  ...catalogueRoutes,
  ...readingRoutes,
  ...photoRoutes([listingPhotoParty, orderPhotoParty]),
  ...listingRoutes(trackRecordOf),
  ...orderRoutes,
  ...moneyRoutes,
];
