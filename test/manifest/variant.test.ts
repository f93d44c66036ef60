import { describe, expect, it } from 'vitest';
import { formatProblem } from '../../src/manifest/index.js';
import { edited, fixtureText, load, packOf, problemsOf } from './fixture.js';

const MODELINE = 'id: qs-2\ntitle: Variant\nbased_on: qs-1\n';
const variant = (keys: string) => packOf(load({ 'boards/qs-2.yaml': MODELINE + keys })).boards[1]!;

describe('a board based on another', () => {
  const [first, second] = packOf(load()).boards;

  it('inherits what it does not give', () => {
    expect(second!.band).toEqual(first!.band);
    expect(second!.columns).toEqual(first!.columns);
    expect(second!.basedOn).toEqual(['qs-1']);
    expect(first!.basedOn).toEqual([]);
  });

  it('lists what it changes, in the order of its file', () => {
    expect(second!.overrides).toEqual([
      'stack_up.strip.foil',
      'stack_up.strip.finish',
      'stack_up.ground.foil',
      'cost.amount',
    ]);
    expect(first!.overrides).toEqual([]);
  });

  it('does not list what it merely repeats', () => {
    const repeated = variant('band: { high: 76.9 GHz, low: 76.2 GHz }\ntemperature: { low: -40 degC }\n');
    expect(repeated.overrides).toEqual(['band.low']);
    expect(repeated.band).toEqual({ low: 76.2e9, high: 76.9e9 });
  });

  it('merges maps and replaces lists', () => {
    const changed = variant('feed: { amplitude: [1, 1, 1] }\ncost: { amount: 5 }\n');
    expect(changed.feed.map((f) => f.amplitude)).toEqual([1, 1, 1]);
    expect(changed.feed[0]!.lossDb?.value).toBe(0.9);
    expect(changed.cost).toEqual({ amount: 5, currency: 'EUR', basis: 'per board at 100000 pieces' });
    expect(changed.overrides).toEqual(['feed.amplitude', 'cost.amount']);
  });

  it('replaces a figure as a whole, so that no source is claimed for another value', () => {
    const whole = variant('stack_up: { laminate: { thickness: { value: 100 um, spread: 10 %, basis: estimated } } }\n');
    expect(whole.stackUp.laminate.thickness).toEqual({
      value: 100e-6,
      minus: 10e-6,
      plus: 10e-6,
      provenance: { basis: 'estimated' },
      path: 'boards/qs-2.yaml: stack_up.laminate.thickness',
    });
    expect(whole.stackUp.strip.thickness.path).toBe('boards/qs-1.yaml: stack_up.strip.thickness');
    const part = load({ 'boards/qs-2.yaml': `${MODELINE}stack_up: { laminate: { thickness: { value: 100 um } } }\n` });
    expect(problemsOf(part).map((p) => p.found)).toEqual(['no key "basis"', 'no key "spread"']);
  });

  it('replaces alternatives without their leftovers', () => {
    const changed = variant(
      'array: { patches: { count: 2, width: 1 mm, length: 1.06 mm } }\nfeed: { path: { line: { width: 0.15 mm, length: 9 mm } } }\n',
    );
    expect(changed.columns[0]!.patches).toHaveLength(2);
    expect(changed.columns[0]!.links).toHaveLength(1);
    expect(changed.feed[0]!.lossDb).toBeUndefined();
    expect(changed.feed[0]!.line).toEqual({ width: 0.15e-3, length: 9e-3 });
  });

  it('drops an inherited key with an empty value', () => {
    const changed = variant('cost:\nstack_up: { below: ~ }\n');
    expect(changed.cost).toBeUndefined();
    expect(changed.stackUp.below).toEqual([]);
    expect(changed.overrides).toEqual(['cost', 'stack_up.below']);
  });

  it('may not drop what every board needs', () => {
    const problems = problemsOf(load({ 'boards/qs-2.yaml': `${MODELINE}band:\n` }));
    expect(problems).toMatchObject([{ file: 'boards/qs-2.yaml', found: 'no key "band"' }]);
  });

  it('does not inherit title and description', () => {
    expect(variant('').description).toBeUndefined();
    expect(variant('').title).toBe('Variant');
    expect(problemsOf(load({ 'boards/qs-2.yaml': 'id: qs-2\nbased_on: qs-1\n' }))).toMatchObject([
      { found: 'no key "title"' },
    ]);
  });

  it('may stand on a chain, whatever the order of the files', () => {
    const pack = packOf(
      load({
        ...edited('pack.yaml', 'boards:\n', 'boards:\n  - boards/qs-3.yaml\n'),
        'boards/qs-3.yaml': 'id: qs-3\ntitle: Third\nbased_on: qs-2\nstack_up: { strip: { finish: bare } }\n',
      }),
    );
    const third = pack.boards[0]!;
    expect(third.basedOn).toEqual(['qs-2', 'qs-1']);
    expect(third.overrides).toEqual(['stack_up.strip.finish']);
    expect(third.stackUp.strip.foil.id).toBe('kf-10');
    expect(third.stackUp.strip.finish.id).toBe('bare');
  });

  it('reports a circle at each of its members and not beyond', () => {
    const problems = problemsOf(
      load({
        ...edited('pack.yaml', 'boards:\n', 'boards:\n  - boards/qs-3.yaml\n'),
        ...edited('boards/qs-1.yaml', 'id: qs-1\n', 'id: qs-1\nbased_on: qs-2\n'),
        'boards/qs-3.yaml': 'id: qs-3\ntitle: Third\nbased_on: qs-2\n',
      }),
    );
    expect(problems.map(formatProblem)).toEqual([
      'boards/qs-1.yaml:3:11  based_on\n  found the circle qs-1 → qs-2 → qs-1; a chain of boards ends at one that stands alone.',
      'boards/qs-2.yaml:4:11  based_on\n  found the circle qs-2 → qs-1 → qs-2; a chain of boards ends at one that stands alone.',
    ]);
  });

  it('is checked as a whole: a fault between its own and inherited keys is reported at its own', () => {
    const problems = problemsOf(load({ 'boards/qs-2.yaml': `${MODELINE}array: { columns: 5 }\n` }));
    expect(problems.map((p) => [p.path, p.found])).toEqual([
      ['feed.amplitude', '3 entries'],
      ['feed.phase', '3 entries'],
    ]);
  });

  it('has an unknown key reported in its own file', () => {
    const problems = problemsOf(load({ 'boards/qs-2.yaml': `${MODELINE}stack_up: { strp: { foil: kf-10 } }\n` }));
    expect(problems).toMatchObject([{ file: 'boards/qs-2.yaml', line: 4, column: 13, fix: 'Did you mean strip?' }]);
    expect(fixtureText('boards/qs-2.yaml')).not.toContain('strp');
  });
});
