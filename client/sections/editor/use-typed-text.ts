import { type ChangeEvent, type FocusEvent, type KeyboardEvent, useState } from 'react';

export type ReadText<Value> =
  { readonly value: Value; readonly error?: never } | { readonly error: string; readonly value?: never };

/**
 * Text being typed for a value: taken over by Enter or on leaving, taken back by Esc; text that cannot be used stays as
 * it was typed, with the reason.
 * @param shown The value in use, as text.
 */
export function useTypedText<Value>(
  shown: string,
  read: (text: string) => ReadText<Value>,
  onCommit: (value: Value) => void,
) {
  const [typed, setTyped] = useState<string | null>(null);
  const [error, setError] = useState<string | undefined>(undefined);
  const close = () => {
    setTyped(null);
    setError(undefined);
  };
  const commit = () => {
    if (typed === null) return;
    const result = read(typed);
    if (result.error !== undefined) {
      setError(result.error);
      return;
    }
    close();
    onCommit(result.value);
  };
  return {
    text: typed ?? shown,
    error,
    close,
    handlers: {
      onChange: (event: ChangeEvent<HTMLInputElement>) => {
        setTyped(event.target.value);
        setError(undefined);
      },
      onFocus: (event: FocusEvent<HTMLInputElement>) => {
        event.target.select();
      },
      onBlur: commit,
      onKeyDown: (event: KeyboardEvent) => {
        if (event.key === 'Enter') commit();
        else if (event.key === 'Escape' && typed !== null) {
          event.preventDefault();
          event.stopPropagation();
          close();
        }
      },
    },
  };
}
