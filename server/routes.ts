// Every route of the product in one list: mounted by the app, described in OpenAPI, walked by the authorisation test.
import type { Route } from './http/route';
import { systemRoutes } from './system/routes';

export const allRoutes: readonly Route[] = [...systemRoutes];
