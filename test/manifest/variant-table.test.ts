import { describe, expect, it } from 'vitest';
import { type Contents, edited, load, packOf, problemsOf } from './fixture.js';

/** The example pack with a table of variants. */
function withTable(table: string | Uint8Array, changes: Contents = {}) {
  const pack = edited('pack.yaml', 'requirements: ', 'variants: [more/variants.csv]\nrequirements: ');
  return load({ ...pack, 'more/variants.csv': table, ...changes });
}
const boardsOf = (table: string) => packOf(withTable(table)).boards;
const withYaml = (yaml: string) =>
  packOf(
    load({ ...edited('pack.yaml', '  - boards/qs-2.yaml', '  - boards/qs-2.yaml\n  - more.yaml'), 'more.yaml': yaml }),
  ).boards[2]!;

describe('a table of variants', () => {
  it('makes of each row the board that the same variant in YAML is', () => {
    const header = 'id,title,based_on,stack_up.strip.foil,stack_up.laminate.thickness.value';
    const more = 'stack_up.laminate.thickness.spread,stack_up.laminate.thickness.basis,feed.amplitude,cost.amount';
    const row = 'qs-3,"Third, of ""three""",qs-1,kf-10,130 um,5 um,estimated,0.5;1; 0.5,2.5';
    const [, , fromTable] = boardsOf(`${header},${more}\r\n${row}\r\n`);
    const fromYaml = withYaml(`id: qs-3
title: Third, of "three"
based_on: qs-1
stack_up:
  strip: { foil: kf-10 }
  laminate: { thickness: { value: 130 um, spread: 5 um, basis: estimated } }
feed: { amplitude: [0.5, 1, 0.5] }
cost: { amount: 2.5 }
`);
    const named = (board: unknown) => JSON.stringify(board).replaceAll('more/variants.csv', 'more.yaml');
    expect(named(fromTable)).toBe(named(fromYaml));
    expect(fromTable?.file).toBe('more/variants.csv');
  });

  it('inherits where a cell is empty, drops where it is ~, also from a row above', () => {
    const [, , third, fourth] = boardsOf(
      'id,title,based_on,cost.amount,tolerances.etch.value,array.retune\nqs-3,a,qs-2,2.5,,length\nqs-4,b,qs-3,,,~\n',
    );
    expect(third).toMatchObject({
      basedOn: ['qs-2', 'qs-1'],
      retune: 'length',
      cost: { amount: 2.5, currency: 'EUR' },
    });
    expect(third!.tolerances.etch?.plus).toBeCloseTo(15e-6, 12);
    expect(fourth).toMatchObject({ basedOn: ['qs-3', 'qs-2', 'qs-1'], cost: { amount: 2.5 } });
    expect(fourth!.retune).toBeUndefined();
  });

  it('takes a byte order mark, and a number where the manifest wants text', () => {
    const [, , third] = boardsOf('\uFEFFid,title,based_on,cost.basis\nqs-3,7,qs-1,12\n');
    expect(third).toMatchObject({ title: '7', cost: { basis: '12' } });
  });

  it('tells how many dummy columns from which', () => {
    const header = 'id,title,based_on,array.dummy_columns,array.direction,feed.amplitude\n';
    const [, , many, some] = boardsOf(`${header}qs-3,a,qs-1,1,alternate,0;1;0\nqs-4,b,qs-1,2;3,,1;0;0\n`);
    const dummies = (board: typeof many) => board!.columns.map((column) => column.dummy ?? false);
    expect(dummies(many)).toEqual([true, false, true]);
    expect(dummies(some)).toEqual([false, true, true]);
    expect(many!.columns[1]!.direction).toBe(-1);
  });

  it('states what a column is sized for', () => {
    const keys = ['frequency', 'patches', 'taper', 'least_width', 'least_gap', 'grid'];
    const header = `id,title,based_on,${keys.map((key) => `array.sized_for.${key}`)}`;
    const [, , third] = boardsOf(`${header}\nqs-3,a,qs-1,76.5 GHz,6,uniform,75 um,100 um,1 um\n`);
    expect(third!.sizedFor).toMatchObject({ patches: 6, taper: { kind: 'uniform' } });
  });

  it('tells each link of the chain with what it overrides', () => {
    const [, , third] = boardsOf('id,title,based_on,stack_up.strip.foil,cost.basis\nqs-3,a,qs-2,kf-04,~\n');
    expect(third!.lineage).toEqual([
      {
        board: 'qs-3',
        file: 'more/variants.csv',
        overrides: [
          { path: 'stack_up.strip.foil', text: 'kf-04' },
          { path: 'cost.basis', text: 'dropped' },
        ],
      },
      expect.objectContaining({
        board: 'qs-2',
        overrides: expect.arrayContaining([{ path: 'cost.amount', text: '3.60' }]),
      }),
      { board: 'qs-1', file: 'boards/qs-1.yaml', overrides: [] },
    ]);
  });

  const header = 'id,title,based_on';
  it.each([
    [
      'an unknown column, with the nearest',
      `${header},stack_up.strip.foyl\nqs-3,a,qs-1,x`,
      1,
      19,
      /foyl/,
      /stack_up\.strip\.foil/,
    ],
    ['a forbidden word', `${header},__proto__.x\nqs-3,a,qs-1,1`, 1, 19, /unknown column "__proto__\.x"/, undefined],
    ['another', `${header},constructor\nqs-3,a,qs-1,1`, 1, 19, /unknown column/, undefined],
    ['a list of maps', `${header},declared\nqs-3,a,qs-1,1`, 1, 19, /declared/, undefined],
    ['a column twice', `${header},cost.amount,cost.amount\nqs-3,a,qs-1,1,2`, 1, 31, /second time/, undefined],
    ['columns in another order', 'id,based_on,title\nqs-3,qs-1,a', 1, 4, /"based_on"/, undefined],
    ['semicolons', 'id;title;based_on\nqs-3;a;qs-1', 1, 1, /semicolons/, undefined],
    ['no row', header, 1, 1, /no row/, undefined],
    ['a quantity without unit', `${header},array.pitch\nqs-3,a,qs-1,2.2`, 2, 13, /2\.2/, /2\.2 mm/],
    ['a word for a number', `${header},cost.amount\nqs-3,a,qs-1,much`, 2, 13, /"much"/, undefined],
    ['an unknown foil', `${header},stack_up.strip.foil\nqs-3,a,qs-1,kf-40`, 2, 13, /kf-40/, /kf-10|kf-04/],
    ['a taken id', `${header}\nqs-1,a,qs-2`, 2, 1, /second time/, undefined],
    ['an unknown parent', `${header}\nqs-3,a,qs-11`, 2, 8, /qs-11/, /qs-1/],
    ['no title', `${header}\nqs-3,,qs-1`, 2, 1, /no key "title"/, /Fill the column title/],
    ['half a figure', `${header},tolerances.etch.value\nqs-3,a,qs-1,1 um`, 2, 13, /no key/, /tolerances\.etch\.\w+/],
    [
      'a value and a part of it',
      `${header},tolerances.etch.spread,tolerances.etch.spread.minus\nqs-3,a,qs-1,1 um,2 um`,
      2,
      18,
      /2 um/,
      undefined,
    ],
    ['wrong CSV', `${header}\nqs-3,"a,qs-1`, 2, 6, /never closed/, undefined],
  ])('reports %s at its cell', (_, table, line, column, found, fix) => {
    const problems = problemsOf(withTable(table)).filter((p) => p.file === 'more/variants.csv');
    const here = problems.find((p) => found.test(p.found));
    expect(here, JSON.stringify(problems)).toMatchObject({ file: 'more/variants.csv', line, column });
    if (fix) expect(here!.fix).toMatch(fix);
  });

  it('refuses what is too large, no text, or too long a list', () => {
    const found = (table: string | Uint8Array) => problemsOf(withTable(table)).map((p) => p.found);
    expect(found(new Uint8Array(1024 * 1024 + 1))[0]).toMatch(/1048577 bytes/);
    expect(found(new Uint8Array([0xff, 0xfe, 0x61]))[0]).toMatch(/not UTF-8/);
    expect(found(`${header}\nqs-3,a\0,qs-1`)[0]).toMatch(/NUL/);
    const rows = Array.from({ length: 101 }, (_, i) => `v-${i},a,qs-1`).join('\n');
    expect(found(`${header}\n${rows}`)[0]).toMatch(/101 rows/);
  });

  it('is hashed among the inputs', () => {
    expect(packOf(withTable(`${header}\nqs-3,a,qs-1\n`)).inputs.map((i) => i.path)).toContain('more/variants.csv');
  });

  it('reports a table that is not there, at its name', () => {
    const pack = edited('pack.yaml', 'requirements: ', 'variants: [none.csv]\nrequirements: ');
    expect(problemsOf(load(pack))[0]).toMatchObject({ file: 'pack.yaml', path: 'variants[0]' });
  });
});
