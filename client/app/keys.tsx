import {
  createContext,
  type ReactNode,
  useContext,
  useEffect,
  useEffectEvent,
  useMemo,
  useState,
} from 'react';

interface KeyEntry {
  /** As printed on the keys: "Shift", "↑", "Z". Several are pressed together. */
  readonly keys: readonly string[];
  /** What it does, in a few words. */
  readonly does: string;
}
export interface KeyGroup {
  readonly title: string;
  readonly entries: readonly KeyEntry[];
}

interface Registry {
  readonly groups: readonly KeyGroup[];
  readonly register: (group: KeyGroup) => () => void;
}

const KeysContext = createContext<Registry | null>(null);

export function KeysProvider({ children }: { children: ReactNode }) {
  const [groups, setGroups] = useState<readonly KeyGroup[]>([]);
  const registry = useMemo(
    () => ({
      groups,
      register: (group: KeyGroup) => {
        setGroups((known) => [...known, group]);
        return () => {
          setGroups((known) => known.filter((other) => other !== group));
        };
      },
    }),
    [groups],
  );
  return <KeysContext value={registry}>{children}</KeysContext>;
}

/** Lists a screen's keys in the help that `?` opens, as long as the screen is shown. `group` is a constant. */
export function useKeys(group: KeyGroup): void {
  const register = useContext(KeysContext)?.register;
  const enter = useEffectEvent(() => register?.(group));
  useEffect(() => enter(), [group]);
}

export function useKeyGroups(): readonly KeyGroup[] {
  return useContext(KeysContext)?.groups ?? [];
}

/** Calls `action` for a plain key that is pressed outside of fields, menus and dialogs. */
export function useHotkey(key: string, action: () => void): void {
  const press = useEffectEvent((event: KeyboardEvent) => {
    if (
      event.key !== key ||
      event.ctrlKey ||
      event.metaKey ||
      event.altKey ||
      event.defaultPrevented ||
      isTaken(event.target)
    )
      return;
    event.preventDefault();
    action();
  });
  useEffect(() => {
    document.addEventListener('keydown', press);
    return () => {
      document.removeEventListener('keydown', press);
    };
  }, []);
}

function isTaken(target: EventTarget | null): boolean {
  if (document.querySelector('dialog[open]')) return true;
  return (
    target instanceof HTMLElement &&
    (target.isContentEditable || target.closest('input, textarea, select, [role="menu"]') !== null)
  );
}
