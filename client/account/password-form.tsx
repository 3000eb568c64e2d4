import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { z } from 'zod';
import { useChangePassword } from '#client/api/me.ts';
import { fieldErrors, ProblemError } from '#client/api/request.ts';
import { signIn } from '#client/app/session.tsx';
import { Button } from '#client/ui/button.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { TextField } from '#client/ui/text-field.tsx';
import { type Me, passwordSchema } from '#server/contracts/people.ts';

const passwordFormSchema = z
  .object({
    current: z.string().min(1, 'Type the password you have now.').max(200),
    next: passwordSchema,
    again: z.string(),
  })
  .refine((typed) => typed.next === typed.again, { path: ['again'], error: 'The two new passwords differ.' });

const EMPTY = { current: '', next: '', again: '' };

/** A new password ends every session; this one signs in again with it at once. */
export function PasswordForm({ me }: { me: Me }) {
  const change = useChangePassword();
  const form = useForm({ resolver: zodResolver(passwordFormSchema), defaultValues: EMPTY });
  const { errors, isSubmitting, isSubmitSuccessful } = form.formState;
  const submit = form.handleSubmit(async ({ current, next }) => {
    try {
      await change.mutateAsync({ current, next });
    } catch (error) {
      for (const [path, message] of fieldErrors(error)) {
        if (path === 'current' || path === 'next') form.setError(path, { message });
      }
      const named = error instanceof ProblemError && fieldErrors(error).size > 0;
      form.setError('root', {
        message: named ? 'The password is as it was.' : `The password is as it was. ${sentenceOf(error)}`,
      });
      return;
    }
    await signIn(me.email, next).catch(() => {
      form.setError('root', { message: 'The password is changed. Sign in again with the new one.' });
    });
  });
  const changed = isSubmitSuccessful && errors.root === undefined;
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="flex max-w-80 flex-col gap-4">
      <input type="email" autoComplete="username" value={me.email} readOnly hidden />
      <TextField
        label="Password now"
        type="password"
        autoComplete="current-password"
        error={errors.current?.message}
        {...form.register('current')}
      />
      <TextField
        label="New password"
        type="password"
        autoComplete="new-password"
        hint="At least 10 characters."
        error={errors.next?.message}
        {...form.register('next')}
      />
      <TextField
        label="New password again"
        type="password"
        autoComplete="new-password"
        error={errors.again?.message}
        {...form.register('again')}
      />
      {errors.root?.message !== undefined && <Notice tone="error">{errors.root.message}</Notice>}
      {changed && <Notice tone="good">The password is changed. Every other session has ended.</Notice>}
      <Button type="submit" busy={isSubmitting} className="self-start">
        Change the password
      </Button>
    </form>
  );
}
