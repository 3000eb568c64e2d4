import { zodResolver } from '@hookform/resolvers/zod';
import { useForm } from 'react-hook-form';
import { OfflineError } from '#client/api/request.ts';
import { signIn, SignInError } from '#client/app/session.tsx';
import { Button } from '#client/ui/button.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { Notice } from '#client/ui/notice.tsx';
import { TextField } from '#client/ui/text-field.tsx';
import { signInSchema } from '#server/contracts/people.ts';

export interface SignInFormProps {
  /** The address of the person whose session ended; typed otherwise. */
  email?: string | undefined;
  onSignedIn: () => Promise<void>;
}

export default function SignInForm({ email = '', onSignedIn }: SignInFormProps) {
  const form = useForm({
    resolver: zodResolver(signInSchema),
    defaultValues: { email, password: '' },
    reValidateMode: 'onChange',
  });
  const { errors, isSubmitting } = form.formState;
  const submit = form.handleSubmit(async (typed) => {
    try {
      await signIn(typed.email, typed.password);
      await onSignedIn();
    } catch (error) {
      form.setError('root', { message: refusalSentence(error) });
      if (error instanceof SignInError && error.refusal === 'wrong')
        form.setFocus('password', { shouldSelect: true });
    }
  });
  return (
    <form noValidate onSubmit={(event) => void submit(event)} className="flex flex-col gap-4">
      <TextField
        label="E-mail"
        type="email"
        autoComplete="username"
        autoCapitalize="none"
        spellCheck={false}
        autoFocus={email === ''}
        error={errors.email?.message}
        {...form.register('email')}
      />
      <TextField
        label="Password"
        type="password"
        autoComplete="current-password"
        autoFocus={email !== ''}
        error={errors.password?.message}
        {...form.register('password')}
      />
      {errors.root?.message !== undefined && <Notice tone="error">{errors.root.message}</Notice>}
      <Button type="submit" variant="primary" busy={isSubmitting} className="h-10 w-full">
        {isSubmitting ? 'Signing in…' : 'Sign in'}
      </Button>
    </form>
  );
}

function refusalSentence(error: unknown): string {
  if (error instanceof OfflineError)
    return 'The server cannot be reached. Check the network of this device, then try again.';
  if (!(error instanceof SignInError)) return sentenceOf(error);
  if (error.refusal === 'wrong') return 'The e-mail address or the password is wrong.';
  if (error.refusal === 'too-many')
    return `Too many attempts. Wait ${waitOf(error.retryAfterSeconds)}, then try again.`;
  return 'Signing in does not work at the moment. Try again shortly.';
}

function waitOf(seconds: number | null): string {
  if (seconds === null) return 'a few minutes';
  if (seconds < 90) return `${String(Math.max(1, Math.ceil(seconds)))} seconds`;
  return `${String(Math.ceil(seconds / 60))} minutes`;
}
