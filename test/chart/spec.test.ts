import type { View } from 'vega';
import { describe, expect, it } from 'vitest';
import { chartSpec } from '../../src/chart/spec.js';
import { theme } from '../../src/chart/theme.js';
import { pictureOf, prepareView, renderSvg } from '../../src/chart/view.js';
import type { Chart, CutChart, LinesChart } from '../../src/dossier/document.js';
import * as fixture from '../render/fixture-charts.js';
import { sceneTexts } from './scene.js';

const charts: readonly (readonly [string, Chart])[] = [
  ['gain budget', fixture.budget],
  ['elevation cut', fixture.elevationCut],
  ['azimuth cut', fixture.azimuthCut],
  ['match', fixture.match],
  ['line loss', fixture.lineLoss],
  ['loss factor', fixture.lossFactor],
];

async function withView<T>(chart: Chart, use: (view: View) => T): Promise<T> {
  const view = await prepareView(chartSpec(chart));
  try {
    return use(view);
  } finally {
    view.finalize();
  }
}

const svgOf = (chart: Chart) => renderSvg(chartSpec(chart));

/** Eight lines that end in one point, with names of very different length. */
const crowded: LinesChart = {
  ...fixture.match,
  series: Array.from({ length: 8 }, (_, i) => ({
    label: `Column ${i + 1}${' of many'.repeat(i % 3)}`,
    points: [
      [75.5, -5 - i],
      [77.9, -10],
    ] as const,
  })),
};

describe.each(charts)('%s', (_, chart) => {
  it('lays no text on another and cuts none', async () => {
    const { texts, width, height } = await withView(chart, (view) => ({ texts: sceneTexts(view), ...pictureOf(view) }));
    expect(texts.length).toBeGreaterThan(5);
    expectApart(texts);
    for (const text of texts) {
      expect(text.x1, text.text).toBeGreaterThanOrEqual(0);
      expect(text.x2, text.text).toBeLessThanOrEqual(width);
      expect(text.y1, text.text).toBeGreaterThanOrEqual(0);
      expect(text.y2, text.text).toBeLessThanOrEqual(height);
    }
  });

  it('is the same bytes twice, also when drawn at once with others', async () => {
    const alone = await svgOf(chart);
    const together = await Promise.all([svgOf(crowded), svgOf(chart), svgOf(fixture.budget)]);
    expect(together[1]).toBe(alone);
  });

  it('holds no definitions, links or styles, and no hyphen in place of a minus', async () => {
    const svg = await svgOf(chart);
    expect(svg).not.toMatch(/\sid="|url\(|<defs|<style|\shref=|graphics-symbol|\saria-label/);
    const words = [...svg.matchAll(/<text[^>]*>([^<]*)</g)].map((match) => match[1]);
    expect(words.filter((word) => /(^|\s)-\d/.test(word))).toEqual([]);
  });
});

function expectApart(texts: ReturnType<typeof sceneTexts>): void {
  texts.forEach((a, i) => {
    for (const b of texts.slice(i + 1)) {
      // Boxes are a line high, letters less: one pixel of contact is none to the eye.
      const across = Math.min(a.x2, b.x2) - Math.max(a.x1, b.x1);
      const down = Math.min(a.y2, b.y2) - Math.max(a.y1, b.y1);
      expect(across > 0.5 && down > 1.5, `"${a.text}" and "${b.text}"`).toBe(false);
    }
  });
}

describe('charts', () => {
  it('spread the names of lines that end in one place', async () => {
    const texts = await withView(crowded, sceneTexts);
    expect(texts.filter((text) => text.text.startsWith('Column'))).toHaveLength(8);
    expectApart(texts);
  });

  it('show units in the axis titles', async () => {
    const words = await withView(fixture.lineLoss, (view) => sceneTexts(view).map((text) => text.text));
    expect(words).toContain('Frequency (GHz)');
    expect(words).toContain('Line loss (dB/cm)');
  });

  it('dot the part of a curve where its model is saturated, and no other line', async () => {
    const dots = `stroke-dasharray="${theme.saturated.join(',')}"`;
    const stuck = (saturatedFrom: number | undefined): LinesChart => ({
      ...crowded,
      series: crowded.series.map((series, i) =>
        i === 2 && saturatedFrom !== undefined ? { ...series, saturatedFrom } : series,
      ),
    });
    const count = async (chart: LinesChart) => (await svgOf(chart)).split(dots).length - 1;
    expect(await count(stuck(undefined))).toBe(0);
    expect(await count(stuck(80))).toBe(0);
    // From the middle on: one piece. From before the beginning: the whole curve, and the sample beside its name.
    expect(await count(stuck(76.7))).toBe(1);
    expect(await count(stuck(70))).toBe(2);
  });

  it('tell lines apart by dash, not only by colour', async () => {
    const svg = await svgOf(crowded);
    const dashes = [...svg.matchAll(/mark-line[^>]*>(?:<path[^>]*>)+/g)].map(
      (match) => /stroke-dasharray="([^"]*)"/.exec(match[0])?.[1] ?? 'solid',
    );
    expect(dashes).toHaveLength(8);
    expect(new Set(dashes).size).toBe(8);
  });

  it('draw single values as symbols of their own shape, without a line between them', async () => {
    const points = fixture.match.series[0].points.filter((_, i) => i % 8 === 0);
    const svg = async (extra: LinesChart['series']) =>
      svgOf({ ...fixture.match, series: [fixture.match.series[0], ...extra] });
    const [without, disc, square] = await Promise.all([
      svg([]),
      svg([{ label: 'Full wave', symbol: 'disc', points }]),
      svg([{ label: 'Full wave', symbol: 'square', points }]),
    ]);
    const lines = (text: string) => text.match(/mark-line/g)?.length ?? 0;
    const marks = (text: string) =>
      [...text.matchAll(/mark-symbol[^>]*>((?:<path[^>]*>(?:<\/path>)?)+)/g)].map(([, m]) => m);
    expect(lines(disc)).toBe(lines(without));
    expect(marks(without)).toHaveLength(0);
    // The values, and one more beside the name.
    expect(marks(disc).join('').match(/<path/g)).toHaveLength(points.length + 1);
    expect(disc.length).not.toBe(square.length);
    expect(marks(disc)[0]).not.toBe(marks(square)[0]);
  });

  it('count in whole numbers where the axis counts', async () => {
    const few: LinesChart = {
      ...fixture.match,
      limits: [],
      marks: [],
      xDomain: [1, 4],
      xWhole: true,
      series: [
        {
          label: 'Network',
          points: [
            [1, -5],
            [4, -9],
          ],
        },
      ],
    };
    const words = await withView(few, (view) => sceneTexts(view).map((text) => text.text));
    expect(words).toEqual(expect.arrayContaining(['1', '2', '3', '4']));
    expect(words).not.toContain('1.5');
  });

  it('leave the solid line to the series that is emphasised', async () => {
    const svg = await svgOf(fixture.match);
    const lines = [...svg.matchAll(/mark-line[^>]*>(?:<path[^>]*>)+/g)].map((match) => match[0]);
    const solid = lines.filter((line) => !line.includes('stroke-dasharray'));
    expect(solid).toHaveLength(1);
    expect(solid[0]).toContain(`stroke="${theme.emphasis.color}"`);
  });

  it('draw a mask at its level, hatched on the forbidden side', async () => {
    const mask: CutChart = {
      ...fixture.azimuthCut,
      series: [],
      masks: [{ label: 'M', pieces: [{ from: -90, to: 0, level: -20 }] }],
    };
    const [plain, hatched] = await Promise.all([svgOf({ ...mask, masks: [] }), svgOf(mask)]);
    const count = (svg: string) => svg.match(/<line /g)?.length ?? 0;
    expect(count(hatched) - count(plain)).toBeGreaterThan(20);
    // 25 of 45 dB below the top of a plot 320 high.
    expect(hatched).toMatch(new RegExp(`translate\\(0,${((25 / 45) * 320).toFixed(3).slice(0, 6)}`));
  });

  it('keep the name of a mask clear of its strokes and its neighbours', async () => {
    const two: CutChart = {
      ...fixture.azimuthCut,
      masks: [
        ...fixture.azimuthCut.masks,
        { label: 'Second limit, close by', pieces: [{ from: -90, to: -30, level: -12 }] },
      ],
    };
    expectApart(await withView(two, sceneTexts));
  });

  it('survive empty and degenerate data', async () => {
    for (const chart of [
      { ...fixture.match, series: [], marks: [], limits: [] },
      {
        ...fixture.lineLoss,
        series: [
          {
            label: 'flat',
            points: [
              [1, 2],
              [2, 2],
            ],
          },
        ],
        limits: [],
      },
      {
        ...fixture.lineLoss,
        series: [
          {
            label: 'missing',
            points: [
              [1, Number.NaN],
              [2, Number.NaN],
            ],
          },
        ],
        limits: [],
      },
      {
        ...fixture.elevationCut,
        series: [
          {
            label: 'below the axis',
            points: [
              [-90, -80],
              [90, -80],
            ],
          },
        ],
        masks: [],
      },
    ] as const satisfies readonly Chart[]) {
      await expect(svgOf(chart)).resolves.toContain('<svg');
    }
  });

  it('refuse a gain budget whose losses do not lead to its end', () => {
    expect(() => chartSpec({ ...fixture.budget, end: { label: 'Realized gain', level: 17.4 } })).toThrow(/17\.4/);
  });

  it('fail when the library warns', async () => {
    const spec = chartSpec(fixture.lossFactor) as unknown as { encoding: { x: { scale: { zero?: boolean } } } };
    spec.encoding.x.scale.zero = false;
    await expect(renderSvg(spec as never)).rejects.toThrow(/zero/);
  });

  it('print hostile labels as text', async () => {
    const hostile = '<script>alert(1)</script>"\'&]]>{{x}}\u2028';
    const svg = await svgOf({
      ...fixture.match,
      xTitle: hostile,
      yTitle: hostile,
      series: [{ label: hostile, points: fixture.match.series[0].points }],
      limits: [{ label: hostile, level: -12 }],
      marks: [{ label: hostile, at: 76 }],
    });
    expect(svg).not.toContain('<script');
    expect(svg).toContain('&lt;script&gt;');
  });
});
