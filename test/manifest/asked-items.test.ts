import { describe, expect, it } from 'vitest';
import { askedItems, askedWords, offeredBoard, offeredFigure } from '../../src/manifest/index.js';
import type { Answer, AskedItem } from '../../src/manifest/procurement-model.js';
import { edited, load, packOf } from './fixture.js';
import { ANSWER_HEAD, asking, askingPack } from './procurement-fixture.js';

const pack = askingPack();
const procurement = pack.procurement!;
const [laminate, foil, fabrication] = procurement.recipients;
const short = ({ id, nominal, lower, upper }: AskedItem) =>
  [id, nominal, lower, upper].map((x) => (typeof x === 'number' ? Number(x.toPrecision(9)) : x));

describe('items asked of a recipient', () => {
  it('are the figures of its material, once for all boards that share them', () => {
    const items = askedItems(laminate, pack.boards, procurement);
    expect(items.map(short)).toEqual([
      ['A-laminate-thickness', 127e-6, 119e-6, 135e-6],
      ['A-permittivity', 3, 2.95, 3.05],
      ['A-loss-tangent', 0.0015, 0.0013, 0.0019],
    ]);
    expect(items[1].figures.map(({ board }) => board)).toEqual(['qs-1', 'qs-2']);
    expect(items.map(({ upperOnly }) => upperOnly)).toEqual([false, false, true]);
  });

  it('have a letter for each material', () => {
    expect(askedItems(foil, pack.boards, procurement).map(({ id, material }) => [id, material])).toEqual([
      ['A-treated-face-texture', 'kf-04'],
      ['A-untreated-face-texture', 'kf-04'],
      ['B-treated-face-texture', 'kf-10'],
      ['B-untreated-face-texture', 'kf-10'],
    ]);
  });

  it('of a fabricator are copper, etching, edge slope and finish layers', () => {
    expect(askedItems(fabrication, pack.boards, procurement).map(({ id, layer }) => [id, layer])).toEqual([
      ['A-copper-thickness', undefined],
      ['A-etched-width', undefined],
      ['A-finish-thickness', 'Ni-P'],
      ['A-finish-thickness-2', 'Au'],
      ['A-edge-slope', undefined],
    ]);
  });

  it('take the intersection of what boards of one nominal value need, and keep other values apart', () => {
    const both = (thickness: string) => ({
      ...asking(),
      ...edited(
        'boards/qs-2.yaml',
        'stack_up:\n',
        `stack_up:\n  laminate:\n    material: nl-30\n    thickness: { value: ${thickness}, basis: guaranteed }\n`,
      ),
    });
    const thickness = (change: string) => {
      const { boards, procurement: asked } = packOf(load(both(change)));
      return askedItems(asked!.recipients[0], boards, asked!)
        .filter(({ parameter }) => parameter === 'laminate-thickness')
        .map(short);
    };
    expect(thickness('127 um, spread: { minus: 12 um, plus: 3 um }')).toEqual([
      ['A-laminate-thickness', 127e-6, 119e-6, 130e-6],
    ]);
    expect(thickness('200 um, spread: 5 um')).toEqual([
      ['A-laminate-thickness', 127e-6, 119e-6, 135e-6],
      ['A-laminate-thickness-2', 200e-6, 195e-6, 205e-6],
    ]);
  });

  it('ask in words for declared properties of its own material, with what is needed, and for substances', () => {
    const words = (recipient: typeof laminate) =>
      askedWords(recipient, pack.boards, pack.requirements.requirements, procurement).map(({ id, needed }) => [
        id,
        needed,
      ]);
    const always = [
      ['S-rohs', undefined],
      ['S-reach', undefined],
      ['S-pfas', undefined],
      ['Q-1', undefined],
    ];
    expect(words(laminate)).toEqual([
      ['D-expansion-through-thickness', undefined],
      ['D-flammability', 'V-0 or V-1'],
      ...always,
    ]);
    expect(words(foil).map(([id]) => id)).toEqual(['D-peel-strength', ...always.map(([id]) => id)]);
    expect(words(fabrication).map(([id]) => id)).toEqual(['D-lead-time', ...always.map(([id]) => id)]);
  });
});

describe('an offered figure', () => {
  const [thickness, , loss] = askedItems(laminate, pack.boards, procurement);
  const asked = pack.boards[0].stackUp.laminate.thickness;
  const answer = (rest: Partial<Answer>): Answer => ({ item: 'x', line: 2, notOffered: false, asked: {}, ...rest });

  it('has the guaranteed range around the typical value', () => {
    expect(
      offeredFigure(
        answer({ guaranteedLower: 120e-6, guaranteedUpper: 130e-6, typical: 126e-6, method: 'm' }),
        thickness,
        asked,
      ),
    ).toEqual({
      value: 126e-6,
      minus: expect.closeTo(6e-6, 12),
      plus: expect.closeTo(4e-6, 12),
      provenance: { basis: 'guaranteed', method: 'm' },
    });
  });

  it('keeps the nominal value where it lies in the range, else takes the middle', () => {
    const value = (guaranteedLower: number, guaranteedUpper: number) =>
      offeredFigure(answer({ guaranteedLower, guaranteedUpper }), thickness, asked)!.value;
    expect(value(120e-6, 140e-6)).toBe(127e-6);
    expect(value(130e-6, 140e-6)).toBeCloseTo(135e-6, 12);
  });

  it('keeps the lower limit where only the upper one counts', () => {
    const lossAsked = pack.boards[0].stackUp.laminate.material.lossTangent;
    const offered = offeredFigure(answer({ guaranteedUpper: 0.0016 }), loss, lossAsked)!;
    expect(
      [offered.value, offered.value - offered.minus, offered.value + offered.plus].map((x) => Number(x.toPrecision(6))),
    ).toEqual([0.0015, 0.0013, 0.0016]);
    const better = offeredFigure(answer({ guaranteedUpper: 0.001 }), loss, lossAsked)!;
    expect([better.value, better.minus, better.plus]).toEqual([0.001, 0, 0]);
  });

  it('moves with a typical value alone, which guarantees nothing', () => {
    expect(offeredFigure(answer({ typical: 125e-6 }), thickness, asked)).toEqual({
      value: 125e-6,
      minus: asked.minus,
      plus: asked.plus,
      provenance: { basis: 'typical' },
    });
  });

  it('is none where nothing is offered', () => {
    expect(offeredFigure(answer({ notOffered: true }), thickness, asked)).toBeUndefined();
    expect(offeredFigure(answer({ alternative: 'other' }), thickness, asked)).toBeUndefined();
  });

  it('replaces the figure on every board that uses it, and nothing else', () => {
    const answered = askingPack('', '', `${ANSWER_HEAD}\nA-permittivity,,2.9,3.1,3.02,,,,\n`);
    const [recipient] = answered.procurement!.recipients;
    const items = askedItems(recipient, answered.boards, answered.procurement!);
    for (const board of answered.boards) {
      const offered = offeredBoard(board, recipient, items);
      const { permittivity, ...material } = offered.stackUp.laminate.material;
      expect(permittivity).toMatchObject({ value: 3.02, path: board.stackUp.laminate.material.permittivity.path });
      const { permittivity: _was, ...before } = board.stackUp.laminate.material;
      expect(material).toEqual(before);
      expect({ ...offered, stackUp: 0 }).toEqual({ ...board, stackUp: 0 });
    }
    expect(offeredBoard(answered.boards[0], { ...recipient, answers: { file: 'x', rows: [] } }, items)).toBe(
      answered.boards[0],
    );
  });
});
