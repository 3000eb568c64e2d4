import { z } from 'zod';
import { idSchema } from './common.ts';
import { accountRoles } from './permissions.ts';

export const preferencesSchema = z.strictObject({
  units: z.enum(['mm', 'inch']),
  theme: z.enum(['system', 'day', 'night']),
});
export type Preferences = z.infer<typeof preferencesSchema>;

export const meSchema = z.object({
  id: idSchema,
  name: z.string(),
  email: z.email(),
  role: z.enum(accountRoles),
  workshop: z.object({ id: idSchema, name: z.string() }),
  preferences: preferencesSchema,
});
export type Me = z.infer<typeof meSchema>;

export const healthSchema = z.object({
  status: z.enum(['ok', 'unavailable']),
  database: z.enum(['ok', 'unavailable']),
  version: z.string(),
});

/** What the sign-in page and every screen need before anybody is known. */
export const passwordSchema = z
  .string()
  .min(10, 'A password has at least 10 characters.')
  .max(200, 'A password has at most 200 characters.');
export const passwordChangeSchema = z.strictObject({ current: z.string().max(200), next: passwordSchema });
export const signInSchema = z.strictObject({
  email: z.email('Type the e-mail address of your account.'),
  password: z.string().min(1, 'Type your password.').max(200),
});
