import { describe, expect, it } from 'vitest';
import { hashPassword, isPassword } from '#server/account/passwords.ts';

describe('passwords', () => {
  it('are kept as Argon2id with the stated cost and a salt of their own', async () => {
    const [one, other] = await Promise.all([hashPassword('the same words'), hashPassword('the same words')]);
    expect(one).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    expect(one).not.toBe(other);
  });

  it('match their own hash only', async () => {
    const hash = await hashPassword('the right words');
    expect(await isPassword('the right words', hash)).toBe(true);
    expect(await isPassword('the right words ', hash)).toBe(false);
    expect(await isPassword('', hash)).toBe(false);
  });

  it('never match where there is no account, not even the words of the stand-in', async () => {
    expect(await isPassword('the password of nobody', null)).toBe(false);
  });
});
