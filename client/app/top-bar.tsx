import { Link, NavLink } from 'react-router';
import { Mark } from './mark.tsx';
import { PersonMenu } from './person-menu.tsx';
import { useMay, useMe } from './session.tsx';

/** Thin chrome above every screen: where one is, whose workshop it is, who is signed in. */
export function TopBar({ onShowKeys }: { onShowKeys: () => void }) {
  const me = useMe();
  const readsShop = useMay('shop.read');
  const readsFlight = useMay('flight-conditions.read');
  return (
    <header className="sticky top-0 z-20 flex h-11 shrink-0 items-stretch gap-x-5 max-sm:h-auto max-sm:flex-wrap border-b border-rule bg-paper px-4 pointer-coarse:h-13 print:hidden">
      <Link
        to="/"
        className="flex items-center gap-2.5 text-lg font-extrabold tracking-tight"
        aria-label="Ribwright, to the start"
      >
        <Mark />
        <span className="max-sm:sr-only">ribwright</span>
      </Link>
      <nav
        aria-label="Main"
        className="flex min-w-0 flex-1 items-stretch gap-4 overflow-x-auto whitespace-nowrap [scrollbar-width:none] max-sm:order-last max-sm:h-7 max-sm:pointer-coarse:h-11 max-sm:text-xs max-sm:w-full max-sm:flex-none max-sm:justify-between max-sm:gap-2"
      >
        {me.role !== 'technician' && <Place to="/">Desk</Place>}
        <Place to="/sections">Sections</Place>
        {readsFlight && <Place to="/flight-conditions">Flight</Place>}
        <Place to="/cut-sheets" short="Sheets">
          Cut sheets
        </Place>
        <Place to="/cutting-list" short="Cutting">
          Cutting list
        </Place>
        {readsShop && <Place to="/shop">Shop</Place>}
      </nav>
      <div className="ml-auto flex min-w-0 shrink-0 items-center gap-4 max-sm:h-10">
        <span className="truncate text-graphite max-md:hidden">{me.workshop.name}</span>
        <PersonMenu me={me} onShowKeys={onShowKeys} />
      </div>
    </header>
  );
}

interface PlaceProps {
  to: string;
  /** A part of the words, for where there is little room; the whole is still spoken. */
  short?: string;
  children: string;
}

function Place({ to, short, children }: PlaceProps) {
  return (
    <NavLink
      to={to}
      className="flex items-center border-b-2 border-transparent px-0.5 pt-0.5 text-graphite hover:text-ink aria-[current=page]:border-ink aria-[current=page]:font-semibold aria-[current=page]:text-ink"
    >
      {short !== undefined && (
        <span aria-hidden="true" className="sm:hidden">
          {short}
        </span>
      )}
      <span className={short === undefined ? '' : 'max-sm:sr-only'}>{children}</span>
    </NavLink>
  );
}
