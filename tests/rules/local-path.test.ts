import { expect, it } from 'vitest';
import { localPath, signInAddress } from '@/lib/auth/local-path';

it.each([
  ['/rounds', '/rounds'],
  ['/rounds/a?x=1&y=2', '/rounds/a?x=1&y=2'],
  ['/a/../b', '/b'],
])('takes the local path %s', (text, path) => {
  expect(localPath(text)).toBe(path);
});

it.each([
  'https://elsewhere.example/',
  '//elsewhere.example',
  '///elsewhere.example',
  '/\\elsewhere.example',
  '\\\\elsewhere.example',
  '/\t/elsewhere.example',
  '/..//elsewhere.example',
  '/x/..//elsewhere.example',
  'javascript:alert(1)',
  'rounds',
  '',
  null,
  undefined,
])('refuses %j, which may lead elsewhere', (text) => {
  expect(localPath(text)).toBeNull();
});

it('makes the address of the sign-in page', () => {
  expect(signInAddress('/rounds?q=a b')).toBe('/sign-in?from=%2Frounds%3Fq%3Da%2520b');
  expect(signInAddress('/')).toBe('/sign-in');
  expect(signInAddress('//elsewhere.example')).toBe('/sign-in');
  expect(signInAddress(null)).toBe('/sign-in');
});
