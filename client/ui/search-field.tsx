import { useEffect, useRef, useState } from 'react';
import { useHotkey } from '#client/app/keys.tsx';
import { fieldClass, fieldHeight } from '#client/ui/field.tsx';

const PAUSE_MS = 250;
const LONGEST = 80;

interface SearchFieldProps {
  label: string;
  /** The search in force. */
  value: string;
  /** Called after a pause in typing, at once on Enter. */
  onSearch: (text: string) => void;
  /** For the machines' desk. */
  large?: boolean | undefined;
  className?: string | undefined;
}

export function SearchField({ label, value, onSearch, large = false, className = '' }: SearchFieldProps) {
  const [text, setText] = useState(value);
  const [inForce, setInForce] = useState(value);
  const input = useRef<HTMLInputElement>(null);
  const timer = useRef<number>(undefined);
  useEffect(
    () => () => {
      clearTimeout(timer.current);
    },
    [],
  );
  useHotkey('/', () => input.current?.focus());

  // The search was changed from elsewhere: a link, the way back, a cleared filter.
  if (value !== inForce) {
    setInForce(value);
    if (value !== text.trim()) setText(value);
  }
  const searchAfter = (typed: string, pause: number) => {
    clearTimeout(timer.current);
    timer.current = window.setTimeout(() => {
      onSearch(typed.trim());
    }, pause);
  };
  return (
    <input
      ref={input}
      type="search"
      aria-label={label}
      placeholder={label}
      maxLength={LONGEST}
      autoComplete="off"
      spellCheck={false}
      value={text}
      onChange={(event) => {
        setText(event.target.value);
        searchAfter(event.target.value, PAUSE_MS);
      }}
      onKeyDown={(event) => {
        if (event.key === 'Enter') searchAfter(text, 0);
        if (event.key !== 'Escape' || text === '') return;
        event.preventDefault();
        setText('');
        searchAfter('', 0);
      }}
      className={`${fieldClass} ${large ? 'h-12 text-base' : fieldHeight} ${className}`}
    />
  );
}
