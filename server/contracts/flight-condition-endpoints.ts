import { z } from 'zod';
import { idSchema } from './common.ts';
import { type Endpoint } from './endpoint.ts';
import {
  conditionChangeSchema,
  conditionCreateSchema,
  storedConditionPageSchema,
  storedConditionSchema,
} from './flight-conditions.ts';

const params = z.object({ conditionId: idSchema });

/** The requests about flight conditions. The list is one page: a workshop keeps few of them. */
export const flightConditionEndpoints = {
  listFlightConditions: {
    method: 'GET',
    path: '/api/flight-conditions',
    summary: 'All flight conditions of the workshop: the default first, then by name, the archived last',
    permission: 'flight-conditions.read',
    reply: storedConditionPageSchema,
  },
  createFlightCondition: {
    method: 'POST',
    path: '/api/flight-conditions',
    summary: 'New flight condition; the first of a workshop is its default',
    permission: 'flight-conditions.write',
    body: conditionCreateSchema,
    reply: storedConditionSchema,
    status: 201,
  },
  getFlightCondition: {
    method: 'GET',
    path: '/api/flight-conditions/:conditionId',
    summary: 'One flight condition',
    permission: 'flight-conditions.read',
    params,
    reply: storedConditionSchema,
  },
  changeFlightCondition: {
    method: 'PATCH',
    path: '/api/flight-conditions/:conditionId',
    summary: 'Name, settings, archive or take back; 409 when another changed it in between',
    permission: 'flight-conditions.write',
    params,
    body: conditionChangeSchema,
    reply: storedConditionSchema,
  },
  setDefaultFlightCondition: {
    method: 'POST',
    path: '/api/flight-conditions/:conditionId/default',
    summary: 'Make it the default of the workshop in the place of the one before; 409 when it is archived',
    permission: 'flight-conditions.write',
    params,
    reply: storedConditionSchema,
  },
} as const satisfies Record<string, Endpoint>;
