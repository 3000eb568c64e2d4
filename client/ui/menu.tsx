import {
  createContext,
  type KeyboardEvent,
  type ReactNode,
  type RefObject,
  useContext,
  useEffect,
  useId,
  useRef,
  useState,
} from 'react';

const CloseContext = createContext<() => void>(() => undefined);

export interface MenuProps {
  /** Spoken name of the button when its content says too little. */
  label?: string | undefined;
  /** What the button shows. */
  trigger: ReactNode;
  /** Classes of the button. */
  className?: string | undefined;
  children: ReactNode;
}

interface Place {
  readonly top?: number;
  readonly bottom?: number;
  readonly right: number;
  readonly maxHeight: number;
}

/** Room in px that most menus need. */
const MENU_HEIGHT = 260;

/** A button with a menu below it: arrows, Home, End and Esc work, focus returns to the button. */
export function Menu({ label, trigger, className, children }: MenuProps) {
  const [place, setPlace] = useState<Place | null>(null);
  const button = useRef<HTMLButtonElement>(null);
  const list = useRef<HTMLDivElement>(null);
  const id = useId();
  const close = () => {
    setPlace(null);
  };
  const open = () => {
    if (button.current) setPlace(placeBeside(button.current));
  };
  const leave = () => {
    close();
    button.current?.focus();
  };
  useLeaving(place !== null, [button, list], close);
  return (
    <>
      <button
        ref={button}
        type="button"
        aria-label={label}
        aria-haspopup="menu"
        aria-expanded={place !== null}
        aria-controls={place === null ? undefined : id}
        onClick={place === null ? open : close}
        onKeyDown={(event) => {
          if (event.key !== 'ArrowDown' || place !== null) return;
          event.preventDefault();
          open();
        }}
        className={className}
      >
        {trigger}
      </button>
      {place !== null && (
        <CloseContext value={close}>
          <MenuList ref={list} id={id} label={label} place={place} onLeave={leave}>
            {children}
          </MenuList>
        </CloseContext>
      )}
    </>
  );
}

/** Below the button, or above it where there is more room. */
function placeBeside(button: HTMLElement): Place {
  const box = button.getBoundingClientRect();
  const right = Math.max(8, document.documentElement.clientWidth - box.right);
  const below = innerHeight - box.bottom - 12;
  return below >= MENU_HEIGHT || below >= box.top
    ? { top: box.bottom + 4, right, maxHeight: below }
    : { bottom: innerHeight - box.top + 4, right, maxHeight: box.top - 12 };
}

interface MenuListProps {
  ref: RefObject<HTMLDivElement | null>;
  id: string;
  label: string | undefined;
  place: Place;
  onLeave: () => void;
  children: ReactNode;
}

function MenuList({ ref, id, label, place, onLeave, children }: MenuListProps) {
  useEffect(() => {
    itemsOf(ref.current)[0]?.focus();
  }, [ref]);
  return (
    <div
      ref={ref}
      id={id}
      role="menu"
      aria-label={label}
      tabIndex={-1}
      style={place}
      onKeyDown={(event) => {
        moveBetweenItems(event, ref.current, onLeave);
      }}
      className="fixed z-50 min-w-52 overflow-y-auto rounded border border-edge bg-sheet py-1 text-left text-sm font-normal text-ink shadow-[0_2px_8px_rgb(0_0_0/0.18)]"
    >
      {children}
    </div>
  );
}

const itemsOf = (list: HTMLElement | null) => [
  ...(list?.querySelectorAll<HTMLElement>('[role^="menuitem"]:not([aria-disabled="true"])') ?? []),
];

function moveBetweenItems(event: KeyboardEvent, list: HTMLElement | null, leave: () => void): void {
  if (event.key === 'Escape' || event.key === 'Tab') {
    event.stopPropagation();
    if (event.key === 'Escape') event.preventDefault();
    leave();
    return;
  }
  const items = itemsOf(list);
  const at = items.findIndex((item) => item === document.activeElement);
  const next = {
    ArrowDown: (at + 1) % items.length,
    ArrowUp: (at - 1 + items.length) % items.length,
    Home: 0,
    End: items.length - 1,
  }[event.key];
  if (next === undefined) return;
  event.preventDefault();
  items[next]?.focus();
}

/** Closes when something else is pressed or the page moves below the menu. */
export function useLeaving(
  open: boolean,
  inside: readonly RefObject<HTMLElement | null>[],
  close: () => void,
): void {
  const [button, list] = inside;
  useEffect(() => {
    if (!open) return;
    const press = (event: PointerEvent) => {
      const target = event.target as Node;
      if (!button?.current?.contains(target) && !list?.current?.contains(target)) close();
    };
    const scroll = (event: Event) => {
      if (!list?.current?.contains(event.target as Node)) close();
    };
    document.addEventListener('pointerdown', press, true);
    document.addEventListener('scroll', scroll, true);
    window.addEventListener('resize', close);
    return () => {
      document.removeEventListener('pointerdown', press, true);
      document.removeEventListener('scroll', scroll, true);
      window.removeEventListener('resize', close);
    };
  });
}

const ITEM =
  'flex w-full items-center gap-2 px-3 py-1.5 text-left outline-none focus:bg-ink focus:text-sheet pointer-coarse:min-h-11 aria-disabled:opacity-50';

export interface MenuItemProps {
  onSelect: () => void;
  children: ReactNode;
  /** Set for a choice of several: shows a mark before the chosen one, and the menu stays open. */
  chosen?: boolean | undefined;
}

export function MenuItem({ onSelect, children, chosen }: MenuItemProps) {
  const close = useContext(CloseContext);
  return (
    <button
      type="button"
      role={chosen === undefined ? 'menuitem' : 'menuitemradio'}
      aria-checked={chosen}
      tabIndex={-1}
      onPointerMove={(event) => {
        event.currentTarget.focus();
      }}
      onClick={() => {
        if (chosen === undefined) close();
        onSelect();
      }}
      className={ITEM}
    >
      {chosen !== undefined && (
        <svg viewBox="0 0 12 12" className="size-3 fill-none stroke-current stroke-2" aria-hidden="true">
          {chosen && <path d="M1.5 6.5 4.5 9.5 10.5 2.5" />}
        </svg>
      )}
      {children}
    </button>
  );
}

export function MenuRule() {
  return <hr className="my-1 border-rule" />;
}

/** A line that names or explains what follows; not an item. */
export function MenuHeading({ children }: { children: ReactNode }) {
  return <div className="px-3 py-1 text-xs text-graphite">{children}</div>;
}
