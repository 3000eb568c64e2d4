import { type Knex } from 'knex';
import { type Handlers } from '#server/http/handlers.ts';
import { refuseField } from '#server/refusal.ts';
import { type AttemptLimit } from './attempt-limit.ts';
import { subjectOf, tooMany } from './auth-routes.ts';
import { hashPassword, isPassword } from './passwords.ts';
import { meOf, withPreferences } from './rules.ts';
import { keepPassword, keepPreferences } from './store.ts';

export function accountHandlers(
  knex: Knex,
  attempts: AttemptLimit,
): Pick<Handlers, 'me' | 'changePreferences' | 'changePassword'> {
  return {
    me: async ({ person }) => meOf(person),
    changePreferences: async ({ person, body }) => {
      const preferences = withPreferences(person.preferences, body);
      await keepPreferences(knex, person, preferences);
      return meOf({ ...person, preferences });
    },
    changePassword: async ({ person, body, request }) => {
      const subject = subjectOf(request.ip, `password of ${person.id}`);
      const wait = attempts.begin(subject);
      if (wait > 0) throw tooMany(wait);
      if (!(await isPassword(body.current, person.passwordHash))) {
        throw refuseField('current', 'This is not your present password.');
      }
      attempts.succeed(subject);
      await keepPassword(knex, person, await hashPassword(body.next));
    },
  };
}
