import { describe, expect, it } from 'vitest';
import { faceGroups } from '../../src/dossier/copper-faces.js';
import { toothDrawing } from '../../src/dossier/tooth-drawing.js';
import type { Board, MeasuredTexture, Texture } from '../../src/manifest/model.js';
import { board, figure } from './board-fixture.js';
import { studyOf } from './study-fixture.js';

/** The board with more known of the strip's face to the laminate. */
function withTexture(more: Partial<Texture>): Board {
  const base = board('qb-1', { rq: 0.4e-6 });
  const { strip } = base.stackUp;
  const texture = { ...strip.dielectricFace.texture, ...more };
  return {
    ...base,
    stackUp: { ...base.stackUp, strip: { ...strip, dielectricFace: { ...strip.dielectricFace, texture } } },
  };
}
const drawn = (subject: Board) => toothDrawing(subject, faceGroups(studyOf(subject).faces));
const rms = (z: readonly number[]) => Math.sqrt(z.reduce((sum, h) => sum + h * h, 0) / z.length);

describe('the tooth of the faces', () => {
  it('draws faces of which the same is known once', () => {
    const { faces } = drawn(board('qb-1', { rq: 0.4e-6 }));
    expect(faces.map(({ label }) => label)).toEqual([
      'Strip underside (treated); ground (treated)',
      'Strip top and edges (foil), bare copper',
    ]);
    expect(faces.map(({ above }) => above)).toEqual(['laminate', 'outside']);
  });

  it('fills its width with the stated Rq and says that it is a sketch and what it assumes', () => {
    const { faces, widthUm } = drawn(withTexture({}));
    const [face] = faces;
    expect(rms(face.profile.heightsUm)).toBeCloseTo(0.4, 3);
    expect((face.profile.heightsUm.length - 1) * face.profile.intervalUm).toBeCloseTo(widthUm, 9);
    expect(face.note).toMatch(
      /^Sketch from stated figures, not a measurement: .*not stated, the gentle 1\.13.*assumed/,
    );
    expect(face.rz).toEqual({ um: 2.2, assumed: true });
  });

  it('takes the stated correlation length, or the one that Sdr implies', () => {
    const stated = drawn(withTexture({ correlationLength: figure('c', 0.9e-6, 0.1e-6) })).faces[0].note;
    expect(stated).toContain('correlation length 0.900');
    expect(stated).not.toContain('assumed');
    expect(drawn(withTexture({ developedAreaRatio: figure('d', 0.3, 0.05) })).faces[0].note).toContain('from Sdr');
  });

  it('draws nodules to scale, one stack a pitch, touching', () => {
    const nodule = { radius: figure('r', 0.25e-6, 0), pitch: figure('p', 0.7e-6, 0), layers: 3 };
    const { faces, widthUm } = drawn(withTexture({ nodule }));
    const { nodules, profile } = faces[0];
    expect(nodules?.radiusUm).toBe(0.25);
    const places = [...new Set(nodules?.centres.map(([x]) => x))];
    expect(places[1] - places[0]).toBeCloseTo(0.7, 9);
    const first = nodules?.centres.filter(([x]) => x === places[0]).map(([, z]) => z) ?? [];
    expect(first).toHaveLength(3);
    expect(first[0] - profile.heightsUm[0]).toBeCloseTo(0.25, 3);
    expect(first[1] - first[0]).toBeCloseTo(0.5, 9);
    // The mean plane is zero: balls and base weigh the same about it, volume over area.
    expect(profile.heightsUm[0]).toBeCloseTo(-(3 * (4 / 3) * Math.PI * 0.25 ** 3) / 0.7 ** 2, 3);
    for (const [x] of nodules?.centres ?? []) {
      expect(x).toBeGreaterThanOrEqual(0.25 - 1e-9);
      expect(x).toBeLessThanOrEqual(widthUm - 0.25 + 1e-9);
    }
  });

  it('draws a measured profile as it was measured', () => {
    const heights = Array.from({ length: 300 }, (_, i) => 0.4e-6 * Math.SQRT2 * Math.sin(i / 7));
    const measured: MeasuredTexture = {
      file: 'textures/kf.csv',
      sha256: 'cd'.repeat(32),
      kind: 'profile',
      interval: 0.1e-6,
      extent: 30e-6,
      section: { interval: 0.1e-6, heights },
      remarks: [],
    };
    const { faces, widthUm } = drawn(withTexture({ measured }));
    expect(faces[0].note).toBe('Measured profile: textures/kf.csv');
    const shown = faces[0].profile;
    expect(shown.intervalUm).toBeCloseTo(0.1, 12);
    expect(shown.heightsUm.length).toBeLessThanOrEqual(Math.floor(widthUm / 0.1) + 1);
    expect(shown.heightsUm[10]).toBeCloseTo(heights[10] * 1e6, 3);
  });

  it('makes room for the roughest face', () => {
    const rough = drawn(board('qb-3', { rq: 2.4e-6 }));
    expect(rough.widthUm).toBeGreaterThan(2 * rough.faces[0].rz.um);
    expect(rough.widthUm).toBeGreaterThanOrEqual(5 * 2.83 * 2.4 * 0.99);
  });
});
