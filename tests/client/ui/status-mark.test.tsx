import { cleanup, render, screen } from '@testing-library/react';
import { afterEach, expect, it } from 'vitest';
import { StatusMark } from '#client/ui/status-mark.tsx';
import { versionStatuses } from '#server/contracts/sections.ts';

afterEach(cleanup);

it('shows every status by its word and by a glyph of its own', () => {
  const { container } = render(
    <>
      {versionStatuses.map((status) => (
        <StatusMark key={status} status={status} />
      ))}
    </>,
  );
  const glyphs = [...container.querySelectorAll('svg')].map((glyph) => glyph.innerHTML);
  expect(versionStatuses.every((status) => screen.getByText(status))).toBe(true);
  expect(new Set(glyphs).size).toBe(versionStatuses.length);
});
