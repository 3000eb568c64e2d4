import { type ComponentProps } from 'react';

type ButtonVariant = 'primary' | 'plain' | 'quiet' | 'danger';
type ButtonSize = 'small' | 'normal' | 'large';

const VARIANTS: Readonly<Record<ButtonVariant, string>> = {
  primary: 'border-wire bg-wire font-semibold text-on-wire hover:border-ink',
  plain: 'border-edge bg-sheet text-ink hover:border-ink',
  quiet: 'border-transparent bg-transparent text-ink hover:border-edge',
  danger: 'border-brick bg-sheet text-brick hover:bg-brick hover:text-sheet',
};
const SIZES: Readonly<Record<ButtonSize, string>> = {
  small: 'h-7 px-2 text-xs',
  normal: 'h-8 px-3 text-sm pointer-coarse:h-11',
  large: 'h-12 px-4 text-base',
};

/** The look of a button, for links that act as one. */
export function buttonClass(variant: ButtonVariant = 'plain', size: ButtonSize = 'normal'): string {
  return `inline-flex shrink-0 items-center justify-center gap-2 rounded border whitespace-nowrap select-none aria-disabled:opacity-50 disabled:cursor-not-allowed disabled:opacity-50 ${VARIANTS[variant]} ${SIZES[size]}`;
}

export interface ButtonProps extends ComponentProps<'button'> {
  variant?: ButtonVariant | undefined;
  size?: ButtonSize | undefined;
  /** Work is under way: the button keeps its place and size and cannot be pressed again. */
  busy?: boolean | undefined;
}

export function Button({
  variant,
  size,
  busy = false,
  className = '',
  disabled,
  type = 'button',
  ...rest
}: ButtonProps) {
  return (
    <button
      {...rest}
      type={type}
      disabled={(disabled ?? false) || busy}
      aria-busy={busy || undefined}
      className={`${buttonClass(variant, size)} ${busy ? 'cursor-progress' : ''} ${className}`}
    />
  );
}
