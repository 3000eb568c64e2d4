import { isRouteErrorResponse, Link, useRouteError } from 'react-router';
import { Button, buttonClass } from '#client/ui/button.tsx';
import { sentenceOf } from '#client/ui/error-state.tsx';
import { NotFound } from './not-found.tsx';

/** A screen that failed: what happened, what was kept, what to do. The rest of the program goes on. */
export function RouteError() {
  const error = useRouteError();
  if (isRouteErrorResponse(error) && error.status === 404) return <NotFound />;
  return (
    <div role="alert" className="mx-auto w-full max-w-160 px-4 py-16">
      <title>Error · Ribwright</title>
      <h1 className="text-xl font-extrabold">This screen stopped</h1>
      <p className="mt-3">
        {isChunkError(error)
          ? 'A part of the program could not be loaded: a newer version may be in place.'
          : sentenceOf(error)}
      </p>
      <p className="mt-2 text-graphite">
        Saved versions are safe, and so is every draft up to its last "kept".
      </p>
      <div className="mt-6 flex flex-wrap gap-2">
        <Button
          variant="primary"
          onClick={() => {
            location.reload();
          }}
        >
          Load the page again
        </Button>
        <Link to="/" reloadDocument className={buttonClass('plain')}>
          To the start
        </Link>
      </div>
    </div>
  );
}

function isChunkError(error: unknown): boolean {
  return (
    error instanceof TypeError && /dynamically imported module|importing a module script/i.test(error.message)
  );
}
