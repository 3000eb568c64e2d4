import { OfflineError, ProblemError } from '#client/api/request.ts';
import { Button } from './button.tsx';

/** One plain sentence about what went wrong. */
export function sentenceOf(error: unknown): string {
  if (error instanceof OfflineError) return 'The server cannot be reached. Check the network of this device.';
  if (error instanceof ProblemError) {
    if (error.status === 503 || error.status === 502)
      return 'The server is not ready at the moment. Try again shortly.';
    if (error.status === 401) return 'Your session has ended.';
    return ended(error.message);
  }
  if (error instanceof Error && error.message !== '') return ended(error.message);
  return 'Something went wrong that this page did not expect.';
}

function ended(sentence: string): string {
  return /[.!?]$/.test(sentence) ? sentence : `${sentence}.`;
}

interface ErrorStateProps {
  error: unknown;
  retry?: (() => void) | undefined;
  /** What could not be done, such as "The sections could not be loaded." */
  title?: string | undefined;
}

/** What happened, what was kept, what to do; stands in the place of what could not be shown. */
export function ErrorState({ error, retry, title = 'This could not be loaded.' }: ErrorStateProps) {
  const requestId = error instanceof ProblemError ? error.problem.requestId : undefined;
  return (
    <div role="alert" className="border-l-2 border-brick py-1 pl-3">
      <p className="font-semibold">{title}</p>
      <p>{sentenceOf(error)} Nothing was changed.</p>
      {requestId !== undefined && <p className="text-xs text-graphite">Request {requestId}</p>}
      {retry && (
        <Button onClick={retry} className="mt-2">
          Try again
        </Button>
      )}
    </div>
  );
}
