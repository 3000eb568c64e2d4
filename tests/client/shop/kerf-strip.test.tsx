import { screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { describe, expect, it, vi } from 'vitest';
import { KerfStrip } from '#client/shop/kerf-strip.tsx';
import { balsa, laser } from '#server/contracts/shop-samples.ts';
import { type Machine, type Material } from '#server/contracts/shop.ts';
import { renderFor, useBrowserParts } from '#tests/client/support/screen.tsx';
import { bench, bow, foam } from './samples.ts';

useBrowserParts();

describe('the test strip', () => {
  async function measure(widths: readonly string[]) {
    const onKerf = vi.fn();
    renderFor(<KerfStrip machine={bench} material={foam} onKerf={onKerf} />);
    for (const [i, width] of widths.entries()) {
      await userEvent.type(screen.getAllByRole('textbox')[i]!, width);
    }
    await userEvent.click(screen.getByRole('button', { name: 'Take the kerf from these widths' }));
    return onKerf;
  }

  it('gives the mean of what the pieces lack', async () => {
    const onKerf = await measure(['9.2', '19.25', '39.15 mm']);
    expect(onKerf).toHaveBeenCalledOnce();
    expect(onKerf.mock.calls[0]?.[0]).toBeCloseTo(0.8, 9);
    expect(screen.getByRole('status').textContent).toBe(
      'Kerf 0.80 mm, the pieces differ by 0.10 mm. Save it below.',
    );
  });

  it('names the piece that cannot be right, and gives no kerf', async () => {
    const onKerf = await measure(['9.2', '21', '39.2']);
    expect(onKerf).not.toHaveBeenCalled();
    expect(screen.getByLabelText('Measured width of the 20 mm piece').getAttribute('aria-invalid')).toBe(
      'true',
    );
  });

  it('is a program for a wire, a drawing for a laser, and battens for two hands', () => {
    const show = (machine: Machine, material: Material) =>
      renderFor(<KerfStrip machine={machine} material={material} onKerf={vi.fn()} />);
    const first = show(bench, foam);
    expect(screen.getByRole('button', { name: 'Download strip.nc' })).toBeTruthy();
    first.unmount();
    const second = show({ ...bench, settings: laser }, { ...foam, settings: balsa });
    expect(screen.getByRole('button', { name: 'Download strip.dxf' })).toBeTruthy();
    second.unmount();
    show(bow, foam);
    expect(screen.queryByRole('button', { name: /^Download/ })).toBeNull();
    expect(screen.getByText(/By hand: cut three pieces/)).toBeTruthy();
  });
});
