import { describe, expect, it } from 'vitest';
import { nearest } from '../../src/manifest/nearest.js';

describe('nearest', () => {
  it.each([
    ['pich', ['columns', 'pitch', 'patches'], 'pitch'],
    ['ptich', ['columns', 'pitch', 'patches'], 'pitch'],
    ['for review', ['draft', 'for_review', 'released'], 'for_review'],
    ['micro-etched', ['foil', 'plated', 'micro_etched'], 'micro_etched'],
    ['Bulk', ['bulk', 'design'], 'bulk'],
    ['rq', ['Rz', 'Rq', 'Ra'], 'Rq'],
    ['kf-4', ['kf-04', 'kf-10'], 'kf-04'],
  ])('takes %s among %j for %s', (found, allowed, meant) => {
    expect(nearest(found, allowed)).toBe(meant);
  });

  it('makes no suggestion that is not like the word found', () => {
    expect(nearest('temperature', ['band', 'array', 'feed'])).toBeUndefined();
    expect(nearest('x', [])).toBeUndefined();
    expect(nearest('y'.repeat(100000), ['pitch'])).toBeUndefined();
  });
});
