import { cleanup, render, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { afterEach, describe, expect, it, vi } from 'vitest';
import { Menu, MenuItem } from '#client/ui/menu.tsx';

afterEach(cleanup);

function show() {
  const onSelect = vi.fn();
  render(
    <>
      <Menu label="Actions" trigger="…">
        <MenuItem onSelect={() => onSelect('open')}>Open</MenuItem>
        <MenuItem onSelect={() => onSelect('archive')}>Archive</MenuItem>
      </Menu>
      <p>elsewhere</p>
    </>,
  );
  return { onSelect, button: screen.getByRole('button', { name: 'Actions' }) };
}

describe('Menu', () => {
  it('opens with the first item focused, moves with the arrows and goes round', async () => {
    const { onSelect, button } = show();
    button.focus();
    await userEvent.keyboard('{ArrowDown}');
    expect(document.activeElement?.textContent).toBe('Open');
    await userEvent.keyboard('{ArrowUp}');
    expect(document.activeElement?.textContent).toBe('Archive');
    await userEvent.keyboard('{Home}{End}{Enter}');
    expect(onSelect.mock.calls).toEqual([['archive']]);
    expect(screen.queryByRole('menu')).toBeNull();
  });

  it('closes on Esc with the focus back on the button', async () => {
    const { button } = show();
    await userEvent.click(button);
    expect(button.getAttribute('aria-expanded')).toBe('true');
    await userEvent.keyboard('{Escape}');
    expect(document.activeElement).toBe(button);
    expect(button.getAttribute('aria-expanded')).toBe('false');
  });

  it('closes when something else is pressed', async () => {
    const { button } = show();
    await userEvent.click(button);
    await userEvent.click(screen.getByText('elsewhere'));
    expect(screen.queryByRole('menu')).toBeNull();
  });
});
