import { useCallback, useState } from 'react';
import { readSettings, type SheetSettings, writeSettings } from './sheet-settings.ts';

const KEY = 'ribwright.sheet';

/** How the sheet is shown, kept in the browser. */
export function useSettings(): readonly [SheetSettings, (change: Partial<SheetSettings>) => void] {
  const [settings, setSettings] = useState(() => readSettings(stored()));
  const change = useCallback((part: Partial<SheetSettings>) => {
    setSettings((before) => {
      const next = { ...before, ...part };
      store(writeSettings(next));
      return next;
    });
  }, []);
  return [settings, change];
}

function stored(): string | null {
  try {
    return localStorage.getItem(KEY);
  } catch {
    return null;
  }
}

/** Without a store the settings last as long as the page. */
function store(text: string): void {
  try {
    localStorage.setItem(KEY, text);
  } catch {
    return;
  }
}
