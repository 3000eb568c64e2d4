import { fireEvent, screen } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { useState } from 'react';
import { describe, expect, it, vi } from 'vitest';
import { QuantityField, type QuantityFieldProps } from '#client/ui/quantity-field.tsx';
import { personOf } from '#tests/client/support/samples.ts';
import { renderFor, useBrowserParts } from '#tests/client/support/screen.tsx';

useBrowserParts();

function Held({ start = 0.12, ...rest }: Partial<QuantityFieldProps> & { start?: number }) {
  const [value, setValue] = useState(start);
  return (
    <QuantityField
      label="Thickness"
      kind="fraction"
      chordMm={220}
      min={0.01}
      max={0.4}
      decimals={2}
      {...rest}
      value={value}
      onCommit={(next) => {
        rest.onCommit?.(next);
        setValue(next);
      }}
    />
  );
}
const field = () => screen.getByRole<HTMLInputElement>('textbox', { name: 'Thickness' });

describe('QuantityField', () => {
  it('commits what was typed on Enter, with unit and arithmetic, and shows it in its own form', async () => {
    const onCommit = vi.fn();
    renderFor(<Held onCommit={onCommit} />);
    await userEvent.type(field(), '{Control>}a{/Control}22 mm / 2{Enter}');
    expect(onCommit.mock.calls).toEqual([[0.05]]);
    expect(field().value).toBe('5.00 %');
  });

  it('commits when the field is left', async () => {
    const onCommit = vi.fn();
    renderFor(<Held onCommit={onCommit} />);
    await userEvent.clear(field());
    await userEvent.type(field(), '14');
    await userEvent.tab();
    expect(onCommit.mock.calls).toEqual([[0.14]]);
  });

  it('keeps text that cannot be used, says why, and ties the sentence to the field', async () => {
    const onCommit = vi.fn();
    renderFor(<Held onCommit={onCommit} />);
    await userEvent.clear(field());
    await userEvent.type(field(), '50{Enter}');
    expect(field().value).toBe('50');
    expect(field().getAttribute('aria-invalid')).toBe('true');
    const sentence = screen.getByText('From 1.00 % to 40.00 %.');
    expect(field().getAttribute('aria-describedby')).toBe(sentence.id);
    expect(onCommit).not.toHaveBeenCalled();
  });

  it('restores on Esc and tells that the preview ended', async () => {
    const onPreview = vi.fn();
    const onCommit = vi.fn();
    renderFor(<Held onPreview={onPreview} onCommit={onCommit} />);
    await userEvent.clear(field());
    await userEvent.type(field(), '13{Escape}');
    expect(field().value).toBe('12.00 %');
    expect(onPreview.mock.calls.slice(-2)).toEqual([[0.13], [null]]);
    expect(onCommit).not.toHaveBeenCalled();
  });

  it('does not commit the rounded value when nothing was typed', async () => {
    const onCommit = vi.fn();
    renderFor(<Held start={0.123456} onCommit={onCommit} />);
    await userEvent.click(field());
    await userEvent.tab();
    expect(onCommit).not.toHaveBeenCalled();
  });

  it('steps by the last decimal with the arrows, by ten with Shift, and no further than the limits', () => {
    const onCommit = vi.fn();
    renderFor(<Held start={0.3985} onCommit={onCommit} />);
    fireEvent.keyDown(field(), { key: 'ArrowUp' });
    fireEvent.keyDown(field(), { key: 'ArrowDown' });
    fireEvent.keyDown(field(), { key: 'ArrowUp', shiftKey: true });
    fireEvent.keyDown(field(), { key: 'ArrowUp', shiftKey: true });
    fireEvent.keyDown(field(), { key: 'ArrowUp' });
    expect(onCommit.mock.calls.flat()).toEqual([0.3986, 0.3985, 0.3995, 0.4]);
  });

  it('shows and reads lengths in the unit of the person', async () => {
    const onCommit = vi.fn();
    renderFor(
      <Held start={254} kind="length" min={10} max={5000} decimals={1} onCommit={onCommit} />,
      personOf('designer', { units: 'inch' }),
    );
    expect(field().value).toBe('10.00 in');
    await userEvent.clear(field());
    await userEvent.type(field(), '8{Enter}');
    expect(onCommit.mock.calls).toEqual([[203.2]]);
  });

  it('does not send the form around it', async () => {
    const onSubmit = vi.fn();
    renderFor(
      <form onSubmit={onSubmit}>
        <Held />
        <button>Send</button>
      </form>,
    );
    await userEvent.type(field(), '{Enter}');
    expect(onSubmit).not.toHaveBeenCalled();
  });

  it('shows an error from outside', () => {
    renderFor(<Held error="The surfaces cross." />);
    expect(screen.getByText('The surfaces cross.')).toBeTruthy();
    expect(field().getAttribute('aria-invalid')).toBe('true');
  });
});
