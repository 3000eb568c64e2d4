import { expect, it } from 'vitest';
import { adviceFor } from '#server/start/steps.mjs';

it.each([
  ['npm error code ENOSPC\nnpm error nospc ENOSPC: no space left on device, write', 'disk is full'],
  ['InnoDB: Operating system error number 28: Errcode: 28 "No space left on device"', 'disk is full'],
  ['npm error code ENOTFOUND\nnpm error network request to https://registry.example failed', 'out of reach'],
  ['npm error code EAI_AGAIN', 'out of reach'],
  ['Err:1 http://deb.example bookworm InRelease\n  Temporary failure resolving', 'out of reach'],
  ['npm error code EACCES\nnpm error syscall mkdir', 'No permission'],
  ['E: Could not get lock /var/lib/dpkg/lock-frontend', 'Another installation'],
  ['npm error code EUSAGE\n`npm ci` can only install packages when they are in sync', 'disagree'],
  ["TRIGGER command denied to user 'shop'@'localhost' for table `shop`.`section_versions`", 'TRIGGER'],
  [
    'You do not have the SUPER privilege and binary logging is enabled (you *might* want to use the less safe log_bin_trust_function_creators variable)',
    'log_bin_trust_function_creators=1',
  ],
  ['connect ECONNREFUSED 127.0.0.1:3306', 'Nothing answers'],
])('knows what helps against %j', (text, advice) => {
  expect(adviceFor(text)).toContain(advice);
});

it('reads the code of an error', () => {
  expect(adviceFor(Object.assign(new Error('listen failed'), { code: 'EADDRINUSE' }))).toContain('PORT');
});

it('knows no advice for what it has not seen', () => {
  expect(adviceFor(new Error('something else'))).toBeUndefined();
});
