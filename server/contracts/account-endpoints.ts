import { type Endpoint } from './endpoint.ts';
import { healthSchema, meSchema, passwordChangeSchema, preferencesSchema } from './people.ts';

/** The requests about the service itself and about one's own account. */
export const accountEndpoints = {
  health: {
    method: 'GET',
    path: '/api/health',
    summary: 'Is the service up',
    permission: 'public',
    reply: healthSchema,
  },
  me: {
    method: 'GET',
    path: '/api/me',
    summary: 'Who is signed in',
    permission: 'account.own',
    reply: meSchema,
  },
  changePreferences: {
    method: 'PATCH',
    path: '/api/me/preferences',
    summary: 'Set units and theme',
    permission: 'account.own',
    body: preferencesSchema.partial(),
    reply: meSchema,
  },
  changePassword: {
    method: 'POST',
    path: '/api/me/password',
    summary: 'Set a new password; ends all sessions',
    permission: 'account.own',
    body: passwordChangeSchema,
    reply: null,
  },
} as const satisfies Record<string, Endpoint>;
