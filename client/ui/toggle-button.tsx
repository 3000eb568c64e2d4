import { type ButtonProps, buttonClass } from './button.tsx';

interface ToggleButtonProps extends Omit<ButtonProps, 'variant' | 'busy' | 'onClick' | 'aria-pressed'> {
  pressed: boolean;
  onPressedChange: (pressed: boolean) => void;
}

/** A button that is on or off; "on" is shown by ground and weight, not by colour alone. */
export function ToggleButton({
  pressed,
  onPressedChange,
  size,
  className = '',
  type = 'button',
  ...rest
}: ToggleButtonProps) {
  return (
    <button
      {...rest}
      type={type}
      aria-pressed={pressed}
      onClick={() => {
        onPressedChange(!pressed);
      }}
      className={`${buttonClass('plain', size)} aria-pressed:border-ink aria-pressed:bg-ink aria-pressed:text-sheet ${className}`}
    />
  );
}
