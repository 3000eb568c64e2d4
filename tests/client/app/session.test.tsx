import { describe, expect, it } from 'vitest';
import { returnPath, startOf } from '#client/app/session.tsx';
import { personOf } from '#tests/client/support/samples.ts';

describe('returnPath', () => {
  it.each([
    ['/sections/1?x=2', '/sections/1?x=2'],
    [null, '/'],
    ['https://elsewhere.example/', '/'],
    ['//elsewhere.example', '/'],
    ['/\\elsewhere.example', '/'],
    ['/sign-in?to=/x', '/'],
  ])('of %s is %s', (to, path) => {
    expect(returnPath(to)).toBe(path);
  });
});

it('starts technicians at the cutting list, everybody else at the desk', () => {
  expect(startOf(personOf('technician'))).toBe('/cutting-list');
  expect(startOf(personOf('designer'))).toBe('/');
});
