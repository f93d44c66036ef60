import { describe, expect, it } from 'vitest';
import { COMPARED_FIGURES, differencesOf, reflectionDifference } from '../../src/dossier/engine-figures.js';
import { trustOf, trustSentences } from '../../src/dossier/engine-trust.js';
import { complex } from '../../src/numerics/complex.js';
import type { EngineComparison } from '../../src/study/results.js';
import { board } from './board-fixture.js';
import { confirmedOf } from './engine-fixture.js';
import { pointOf } from './study-fixture.js';

const subject = board('qb-1');
const confirmation = confirmedOf(subject, pointOf);
if (confirmation.kind === 'network only') throw new Error('the fixture is confirmed');
const { points } = confirmation;
const alike = points.map((point): EngineComparison => ({ ...point, network: point.fullWave }));

const figureOf = (id: string) => {
  const found = COMPARED_FIGURES.find((figure) => figure.id === id);
  if (found === undefined) throw new Error(`no figure ${id}`);
  return found;
};

describe('comparison of two engines', () => {
  it('finds no difference where the engines agree, and every figure there is', () => {
    const found = differencesOf(subject, alike);
    expect(found).toHaveLength(COMPARED_FIGURES.length);
    for (const { figure, points: differences } of found) {
      expect(differences, figure.id).toHaveLength(alike.length);
      for (const { difference } of differences) expect(difference).toBe(0);
    }
    for (const point of alike) expect(reflectionDifference(point)).toBe(0);
  });

  it('changes sign with the order of the engines, and the complex difference does not', () => {
    const turned = points.map((p): EngineComparison => ({ ...p, fullWave: p.network, network: p.fullWave }));
    const [there, back] = [differencesOf(subject, points), differencesOf(subject, turned)];
    there.forEach(({ points: a }, i) => {
      a.forEach(({ difference }, j) => {
        expect(difference + back[i].points[j].difference).toBeCloseTo(0, 12);
      });
    });
    points.forEach((point, i) => {
      expect(reflectionDifference(point)).toBeCloseTo(reflectionDifference(turned[i]), 12);
    });
  });

  it('takes the strongest coupling between neighbours in place, not in number', () => {
    // Columns 1 and 3 stand side by side; 1 and 2 are farther apart and couple more by number only.
    const columns = [-2.2e-3, 2.2e-3, 0].map((y, i) => ({ ...subject.columns[i], y }));
    const at = (k: number) => complex(10 ** (-k / 20));
    const scattering = [
      [complex(0), at(20), at(31)],
      [at(20), complex(0), at(33)],
      [at(31), at(33), complex(0)],
    ];
    const value = figureOf('coupling').of({ ...points[0].fullWave, scattering }, { ...subject, columns });
    expect(value).toBeCloseTo(-31, 9);
  });

  it('has no coupling on a board of one column', () => {
    const single = { ...subject, columns: subject.columns.slice(0, 1), feed: subject.feed.slice(0, 1) };
    const one = { ...points[0].fullWave, scattering: [[complex(0.1)]], activeReflection: [complex(0.1)] };
    expect(figureOf('coupling').of(one, single)).toBeNaN();
  });

  it('leaves columns without a wave of their own out of active reflection', () => {
    const feed = subject.feed.map((path, i) => ({ ...path, amplitude: i === 0 ? 0 : 1 }));
    const activeReflection = [complex(0.9), complex(0.1), complex(0, 0.2)];
    const value = figureOf('active-reflection').of({ ...points[0].fullWave, activeReflection }, { ...subject, feed });
    expect(value).toBeCloseTo(20 * Math.log10(0.2), 9);
  });
});

describe('trust in the fast engine', () => {
  it('is whole where the engines agree', () => {
    expect(trustOf(subject, alike).every(({ inside }) => inside)).toBe(true);
    expect(trustSentences(subject, alike).at(-1)).toContain('can be trusted on this board');
  });

  it('ends for the figure that differs by more than is granted, and says by how much', () => {
    const off = alike.map((point, i) =>
      i === 1
        ? { ...point, network: { ...point.fullWave, directivity: point.fullWave.directivity * 10 ** -0.05 } }
        : point,
    );
    const outside = trustOf(subject, off).filter(({ inside }) => !inside);
    expect(outside.map(({ figure }) => figure.id)).toEqual(['directivity', 'gain']);
    expect(outside[0].difference).toBeCloseTo(0.5, 9);
    expect(outside[0].frequency).toBe(points[1].frequency);
    const text = trustSentences(subject, off).join(' ').replaceAll('\u00a0', ' ');
    expect(text).toMatch(/directivity \(\+0\.50 dB, granted \+0\.15 dB\)/);
    expect(text).toContain('must not be relied on');
    expect(text).not.toContain('Nothing lies outside');
  });
});
