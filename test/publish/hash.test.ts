import { expect, it } from 'vitest';
import { hashOfSet, sha256 } from '../../src/publish/index.js';

it('is SHA-256: the test vector "abc" of FIPS 180-2, appendix B.1', () => {
  expect(sha256('abc')).toBe('ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad');
});

it('of a set does not depend on its order, but on every name and content', () => {
  const [a, b] = [['a', sha256('1')] as const, ['b', sha256('2')] as const];
  expect(hashOfSet([a, b])).toBe(hashOfSet([b, a]));
  const others = [hashOfSet([a]), hashOfSet([a, ['c', b[1]]]), hashOfSet([a, ['b', a[1]]])];
  expect(new Set([...others, hashOfSet([a, b])]).size).toBe(4);
});
