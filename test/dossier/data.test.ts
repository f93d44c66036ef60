import { Ajv2020 } from 'ajv/dist/2020.js';
import { describe, expect, it } from 'vitest';
import { dataSchemas, packData } from '../../src/dossier/index.js';
import { inputOf, studies } from './pack-fixture.js';

const files = packData(inputOf(studies()));
const schemas = dataSchemas();
const ajv = new Ajv2020({ strict: true, allowUnionTypes: true });
const validate = {
  pack: ajv.compile(schemas['data/pack.schema.json']),
  board: ajv.compile(schemas['data/board.schema.json']),
};

function numbers(value: unknown): readonly number[] {
  if (typeof value === 'number') return [value];
  return typeof value === 'object' && value !== null ? Object.values(value).flatMap(numbers) : [];
}

describe('data files', () => {
  it('are one for the pack and one per board', () => {
    expect(Object.keys(files)).toEqual([
      'data/pack.json',
      'data/board-qb-1.json',
      'data/board-qb-2.json',
      'data/board-qb-3.json',
    ]);
  });

  it('fit their published schema after a round trip through JSON', () => {
    for (const [name, data] of Object.entries(files)) {
      const read = JSON.parse(JSON.stringify(data));
      const check = name === 'data/pack.json' ? validate.pack : validate.board;
      expect(check(read), JSON.stringify(check.errors)).toBe(true);
      expect(read).toEqual(data);
    }
  });

  it('are refused by the schema when a field is missing, unknown or no number', () => {
    const good = JSON.parse(JSON.stringify(files['data/pack.json']));
    expect(validate.pack({ ...good, verdicts: undefined })).toBe(false);
    expect(validate.pack({ ...good, extra: 1 })).toBe(false);
    expect(validate.pack({ ...good, verdicts: [{ ...good.verdicts[0], margin: 'large' }] })).toBe(false);
  });

  it('hold finite numbers of at most 12 significant digits', () => {
    const found = Object.values(files).flatMap(numbers);
    expect(found.length).toBeGreaterThan(1000);
    for (const n of found) expect(Number(n.toPrecision(12))).toBe(n);
  });

  it('say how the columns are confirmed, with the S-matrix of both engines and of the nominal state', () => {
    const boardOf = (name: string) => {
      const data = files[name];
      if (data.kind !== 'board') throw new Error('not a board');
      return data;
    };
    const { confirmation, nominal } = boardOf('data/board-qb-1.json');
    if (confirmation.kind !== 'full wave') throw new Error('not confirmed');
    expect(confirmation.points.map(({ frequencyHz }) => frequencyHz)).toEqual([76.1e9, 76.5e9, 76.9e9]);
    for (const { fullWave, network } of confirmation.points)
      for (const { scattering, excitation } of [fullWave, network]) {
        expect(scattering.map((row) => row.length)).toEqual([3, 3, 3]);
        expect(excitation.map((column) => column.length)).toEqual([6, 6, 6]);
      }
    expect(nominal.every(({ scattering }) => scattering?.length === 3)).toBe(true);
    expect(boardOf('data/board-qb-2.json').confirmation).toEqual({
      kind: 'network only',
      reason: 'the pack switched the full wave off',
    });
  });

  it('carry the cautions', () => {
    for (const data of Object.values(files)) {
      expect(data.notices.join(' ')).toContain('not a declaration of conformity');
      expect(data.notices.join(' ')).toContain('invented');
    }
  });

  it('keep verdicts to more digits than pages print', () => {
    const data = files['data/pack.json'];
    if (data.kind !== 'pack') throw new Error('not the pack');
    const gain = data.verdicts.find((v) => v.boardId === 'qb-1' && v.requirementId === 'r-gain');
    expect(gain?.status).toBe('meets');
    expect(String(gain?.margin).length).toBeGreaterThan(8);
  });
});
