import { describe, expect, it } from 'vitest';
import type { QuantityName, Requirement } from '../../src/manifest/model.js';
import { complex } from '../../src/numerics/complex.js';
import type { PointResult } from '../../src/study/results.js';
import { ENGINE_ACCURACY } from '../../src/verdict/engine-accuracy.js';
import { marginOf, QUANTITIES, quantityOf } from '../../src/verdict/quantities.js';
import { board, requirement } from '../dossier/board-fixture.js';
import { pointOf } from '../dossier/study-fixture.js';

const subject = board('qb-1');
const point = pointOf(subject, 76.5e9, 25);
const value = (quantity: QuantityName, change: Partial<PointResult>, extra: Partial<Requirement> = {}) =>
  quantityOf(quantity).at(
    { ...point, ...change },
    { requirement: requirement('r', { quantity, cut: 'elevation', ...extra }), board: subject },
  );

describe('requirement quantities', () => {
  it('turn ratios into levels', () => {
    expect(value('gain', { gain: 20 })).toHaveProperty('value', 10 * Math.log10(20));
    expect(value('directivity', { directivity: 100 })).toEqual({ value: 20 });
    expect(value('realized_gain', { realizedGain: 10 })).toEqual({ value: 10 });
  });

  it('take line loss from the line, not from the columns', () => {
    const { onLine } = quantityOf('line_loss');
    const at = { frequency: 76.5e9, temperatureC: 25, effectivePermittivity: 2.4, impedance: 50 };
    expect(onLine?.({ ...at, lossDbPerM: 45 })).toEqual({ value: 0.45 });
    expect(onLine?.({ ...at, lossDbPerM: Number.NaN })).toHaveProperty('missing');
    expect(value('line_loss', {})).toHaveProperty('missing');
  });

  it('take the worst column for reflection', () => {
    const columnReflection = [complex(0.06, 0.08), complex(0, -0.2), complex(0.1)];
    expect(value('reflection', { columnReflection })).toHaveProperty('value', 20 * Math.log10(0.2));
  });

  it('leave columns without an incident wave out of the active reflection', () => {
    const feed = subject.feed.map((path, i) => ({ ...path, amplitude: i === 0 ? 0 : 1 }));
    const activeReflection = [complex(Number.NaN), complex(0.1), complex(0.2)];
    const context = { requirement: requirement('r', { quantity: 'active_reflection' }), board: { ...subject, feed } };
    const found = quantityOf('active_reflection').at({ ...point, activeReflection }, context);
    expect(found).toHaveProperty('value', 20 * Math.log10(0.2));
  });

  it('compare the magnitude of the beam direction with an upper and the signed angle with a lower limit', () => {
    const elevation = { ...point.elevation, beamDirection: (-2 * Math.PI) / 180 };
    const limit = (direction: 'at_least' | 'at_most') => ({ limit: { direction, value: 1 } });
    expect(value('beam_direction', { elevation }, limit('at_most'))).toEqual({ value: 2 });
    expect(value('beam_direction', { elevation }, limit('at_least'))).toEqual({ value: -2 });
  });

  it('say why there is no number instead of giving one', () => {
    const elevation = { beamDirection: Number.NaN, halfPowerBeamwidth: Number.NaN, sidelobeDb: Number.NaN };
    for (const quantity of ['beam_direction', 'half_power_beamwidth', 'sidelobe_level'] as const) {
      expect(value(quantity, { elevation })).toHaveProperty('missing');
    }
    expect(value('gain', { gain: Number.NaN })).toHaveProperty('missing');
    expect(value('reflection', { columnReflection: [complex(0.1), complex(Number.NaN)] })).toHaveProperty('missing');
    expect(value('sidelobe_level', {}, { cut: undefined })).toHaveProperty('missing');
  });

  it('each have a title, a definition, a unit, and an engine accuracy with its ground', () => {
    for (const quantity of QUANTITIES) {
      expect(quantity.definition).toMatch(/^[A-Z].*\.$/);
      if (quantity.name === 'declared') continue;
      expect(quantity.unit).not.toBe('');
      expect(ENGINE_ACCURACY.filter((entry) => entry.quantity === quantity.name)).toHaveLength(1);
    }
  });

  it('measure the margin towards the inside of either limit', () => {
    expect(marginOf({ direction: 'at_least', value: 10 }, 12)).toBe(2);
    expect(marginOf({ direction: 'at_most', value: -12 }, -15)).toBe(3);
  });
});
