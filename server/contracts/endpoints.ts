import { accountEndpoints } from './account-endpoints.ts';
import { cutSheetEndpoints } from './cut-sheet-endpoints.ts';
import { cuttingListEndpoints } from './cutting-list-endpoints.ts';
import { type Endpoint } from './endpoint.ts';
import { flightConditionEndpoints } from './flight-condition-endpoints.ts';
import { sectionEndpoints } from './section-endpoints.ts';
import { shopEndpoints } from './shop-endpoints.ts';

/**
 * Every request of the API as data: the server registers its routes from it, the OpenAPI document and the permission matrix of the
 * tests are made from it. The client takes each noun's own table, so that a screen loads only what it asks for.
 */
export const endpoints = {
  ...accountEndpoints,
  ...sectionEndpoints,
  ...shopEndpoints,
  ...cutSheetEndpoints,
  ...cuttingListEndpoints,
  ...flightConditionEndpoints,
} as const satisfies Record<string, Endpoint>;
export type EndpointName = keyof typeof endpoints;
