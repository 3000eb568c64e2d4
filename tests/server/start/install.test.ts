import { describe, expect, it } from 'vitest';
import { isInstalled, isNodeNewEnough } from '#server/start/install.mjs';

describe('isNodeNewEnough', () => {
  it.each([
    ['20.19.0', true],
    ['20.20.2', true],
    ['22.0.0', true],
    ['20.18.3', false],
    ['18.99.0', false],
    ['9.20.0', false],
  ])('judges %s against >=20.19: %s', (version, expected) => {
    expect(isNodeNewEnough(version, '>=20.19')).toBe(expected);
  });
});

describe('isInstalled', () => {
  const lock = {
    packages: {
      '': { version: '0.1.0' },
      'node_modules/one': { version: '1.2.3' },
      'node_modules/other-platform': { version: '1.0.0', optional: true },
    },
  };

  it('takes what the lock asks for, without packages for other platforms', () => {
    expect(isInstalled(lock, { packages: { 'node_modules/one': { version: '1.2.3' } } })).toBe(true);
  });

  it('sees a package that is missing', () => {
    expect(isInstalled(lock, { packages: {} })).toBe(false);
  });

  it('sees another version, of an optional package too', () => {
    expect(isInstalled(lock, { packages: { 'node_modules/one': { version: '1.2.4' } } })).toBe(false);
    const older = {
      'node_modules/one': { version: '1.2.3' },
      'node_modules/other-platform': { version: '0.9.0' },
    };
    expect(isInstalled(lock, { packages: older })).toBe(false);
  });
});
