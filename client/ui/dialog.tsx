import { type ReactNode, useEffect, useId, useRef } from 'react';
import { Button } from './button.tsx';

interface DialogProps {
  title: string;
  /** Called once when the dialog is left: Esc, the close button, or a press on the backdrop when `light`. */
  onClose: () => void;
  children: ReactNode;
  /** The buttons at the foot, the main one last. */
  actions?: ReactNode;
  width?: 'narrow' | 'normal' | 'wide' | undefined;
  /** A press outside closes it. Only for dialogs in which nothing is typed. */
  light?: boolean | undefined;
  /** Esc and the close button are off: the dialog must be answered. */
  modalOnly?: boolean | undefined;
}

/** Where typing begins, rather than at the close button. */
const FIRST_FIELD =
  ':is(input, textarea, select):not(:disabled, [hidden], [type="radio"], [type="checkbox"])';

const WIDTHS = { narrow: 'max-w-100', normal: 'max-w-140', wide: 'max-w-200' } as const;

/** A native modal dialog, open as long as it is rendered: focus stays inside and returns to where it was. */
export function Dialog(props: DialogProps) {
  const { title, onClose, children, actions, width = 'normal', light = false, modalOnly = false } = props;
  const element = useOpenDialog();
  const titleId = useId();
  return (
    <dialog
      ref={element}
      aria-labelledby={titleId}
      onCancel={(event) => {
        if (event.target !== event.currentTarget) return;
        event.preventDefault();
        if (!modalOnly) onClose();
      }}
      onClose={(event) => {
        // The browser closes by itself when Esc is pressed again and again.
        if (event.target !== event.currentTarget || event.currentTarget.open) return;
        if (modalOnly) event.currentTarget.showModal();
        else onClose();
      }}
      onClick={(event) => {
        if (light && event.target === event.currentTarget) onClose();
      }}
      className={`m-auto max-h-[calc(100dvh-2rem)] w-[calc(100%-2rem)] overflow-visible rounded border border-edge bg-paper text-ink print:hidden ${WIDTHS[width]}`}
    >
      <div className="flex max-h-[calc(100dvh-2rem)] flex-col">
        <header className="flex min-h-11 items-center justify-between gap-4 border-b border-rule py-1.5 pr-2 pl-4">
          <h2 id={titleId} className="text-base font-semibold">
            {title}
          </h2>
          {!modalOnly && <CloseButton onClose={onClose} />}
        </header>
        <div className="min-h-0 flex-1 overflow-y-auto p-4">{children}</div>
        {actions !== undefined && (
          <footer className="flex flex-wrap justify-end gap-2 border-t border-rule px-4 py-3">
            {actions}
          </footer>
        )}
      </div>
    </dialog>
  );
}

function useOpenDialog() {
  const element = useRef<HTMLDialogElement>(null);
  useEffect(() => {
    const dialog = element.current;
    const before = document.activeElement;
    dialog?.showModal();
    dialog?.querySelector<HTMLElement>(FIRST_FIELD)?.focus();
    return () => {
      dialog?.close();
      if (before instanceof HTMLElement && before.isConnected) before.focus();
    };
  }, []);
  return element;
}

function CloseButton({ onClose }: { onClose: () => void }) {
  return (
    <Button
      variant="quiet"
      size="small"
      aria-label="Close"
      onClick={onClose}
      className="pointer-coarse:size-11"
    >
      <svg viewBox="0 0 12 12" className="size-3 fill-none stroke-current stroke-[1.5]" aria-hidden="true">
        <path d="M1 1 11 11M11 1 1 11" />
      </svg>
    </Button>
  );
}
