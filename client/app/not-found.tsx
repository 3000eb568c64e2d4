import { Link } from 'react-router';
import { buttonClass } from '#client/ui/button.tsx';

export function NotFound() {
  return (
    <div className="mx-auto w-full max-w-160 px-4 py-16">
      <title>Not found · Ribwright</title>
      <h1 className="text-xl font-extrabold">Nothing is here</h1>
      <p className="mt-3">
        There is no such page, or it is not in your workshop. The address may be mistyped, or the section is
        gone.
      </p>
      <Link to="/" className={`mt-6 ${buttonClass('primary')}`}>
        To the start
      </Link>
    </div>
  );
}
