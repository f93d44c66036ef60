import { createHash } from 'node:crypto';
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatProblem, packFor } from '../../src/manifest/index.js';
import type { Texture } from '../../src/manifest/model.js';
import { type Contents, edited, load, packOf, problemsOf } from './fixture.js';
import { writeZip, x3pFiles } from './texture-files/write-x3p.js';

const RQ =
  'Rq: { value: 0.4 um, spread: 0.05 um, basis: measured, method: white-light interferometer, document: KF-TR-112, revision: A, date: 2026-01-19 }';
const INSTRUMENT = 'instrument: white-light interferometer, 50x';
const REST = `\n      ${INSTRUMENT}\n      filter: S-filter 0.25 um, L-filter 25 um\n`;
const figure = (value: string | number, spread: string | number = '10 %') =>
  `{ value: ${value}, spread: ${spread}, basis: measured }`;

/** The treated face of the first foil with other keys than it has. */
const faced = (...keys: string[]): Contents => edited('foils.yaml', RQ + REST, `${keys.join('\n      ')}\n`);
const textureFrom = (contents: Contents): Texture =>
  packOf(load(contents)).boards[0]!.stackUp.strip.dielectricFace.texture;
const messagesOf = (contents: Contents) => problemsOf(load(contents)).map(formatProblem);

describe('a texture as stated', () => {
  it('takes a maximum height beside the height that Rq comes from', () => {
    const { rq, rz, stated, conversion } = textureFrom(faced(`Ra: ${figure('0.3 um')}`, `Rz: ${figure('2.4 um')}`));
    expect(stated).toEqual({ parameter: 'Ra', value: 0.3e-6 });
    expect(rq.path).toBe('foils.yaml: kf-04.treated_face.Ra');
    expect(rz).toMatchObject({ value: 2.4e-6, minus: 0.24e-6, path: 'foils.yaml: kf-04.treated_face.Rz' });
    expect(conversion).toMatch(/times the stated Ra/);
  });

  it('still converts a maximum height that stands alone', () => {
    const { rz, stated } = textureFrom(faced(`Rz: ${figure('2.2 um')}`));
    expect(stated.parameter).toBe('Rz');
    expect(rz).toBeUndefined();
  });

  it('gives the correlation length of a Gaussian autocorrelation from Sal, and says so', () => {
    const { correlationLength: l, lengthConversion } = textureFrom(
      faced(RQ, `Sal: ${figure('1 um', 0)}`.replace('spread: 0', 'spread: 0 um')),
    );
    // exp(−(Sal/l)²) = 0.2: l = Sal/√ln 5.
    expect(l!.value).toBeCloseTo(1e-6 / Math.sqrt(Math.log(5)), 12);
    // exp(−Sal/l) = 0.2 and exp(−1): l = Sal/ln 5. cos(k Sal) = 0.2, cos(k l) = 1/e.
    expect(l!.value - l!.minus).toBeCloseTo(1e-6 / Math.log(5), 12);
    expect(l!.value + l!.plus).toBeCloseTo((1e-6 * Math.acos(1 / Math.E)) / Math.acos(0.2), 12);
    expect(l!.path).toBe('foils.yaml: kf-04.treated_face.Sal');
    expect(lengthConversion).toMatch(/0\.788 times the stated Sal \(fall to 0\.2\).*Gaussian/);
  });

  it('needs no conversion where Sal is taken at 1/e, and adds none where the length itself is stated', () => {
    const atE = textureFrom(faced(RQ, `Sal: ${figure('1 um', '0.1 um')}`, `Sal_threshold: ${Math.exp(-1)}`));
    expect(atE.correlationLength!.value).toBeCloseTo(1e-6, 12);
    expect(atE.correlationLength!.plus).toBeCloseTo(0.1e-6, 12);
    const own = textureFrom(faced(RQ, `correlation_length: ${figure('1 um', '0.1 um')}`));
    expect(own.correlationLength).toMatchObject({ value: 1e-6, plus: 0.1e-6 });
    expect(own.lengthConversion).toBeUndefined();
  });

  it.each([
    ['12 %', 0.12],
    [0.12, 0.12],
    ['150 %', 1.5],
  ])('reads Sdr %s as a ratio, its spread as a share of it', (written, value) => {
    const { developedAreaRatio } = textureFrom(faced(RQ, `Sdr: ${figure(written, '25 %')}`));
    expect(developedAreaRatio!.value).toBeCloseTo(value, 12);
    expect(developedAreaRatio!.minus).toBeCloseTo(0.25 * value, 12);
  });

  it('takes a plain number as the spread of Sdr', () => {
    const { developedAreaRatio } = textureFrom(faced(RQ, `Sdr: ${figure('12 %', 0.03)}`));
    expect(developedAreaRatio).toMatchObject({ value: 0.12, minus: 0.03, plus: 0.03 });
  });

  it('keeps lay and nodules, one layer unless stated', () => {
    const nodules = `nodules: { radius: ${figure('0.2 um', '0.01 um')}, pitch: ${figure('0.6 um', '0.05 um')} }`;
    const { lay, nodule } = textureFrom(faced(RQ, 'lay: across', nodules));
    expect(lay).toBe('across');
    expect(nodule).toMatchObject({ radius: { value: 0.2e-6 }, pitch: { value: 0.6e-6, minus: 0.05e-6 }, layers: 1 });
    expect(nodule!.radius.path).toBe('foils.yaml: kf-04.treated_face.nodules.radius');
  });

  it('lays nodules per area on a square lattice', () => {
    const nodules = `nodules: { radius: ${figure('0.1 um', '0 um')}, per_area: ${figure('4 1/um2', '1 1/um2')}, layers: 4 }`;
    const { pitch, layers } = textureFrom(faced(RQ, nodules)).nodule!;
    expect(pitch.value).toBeCloseTo(0.5e-6, 12);
    expect(pitch.value - pitch.minus).toBeCloseTo(1e-6 / Math.sqrt(5), 12);
    expect(pitch.value + pitch.plus).toBeCloseTo(1e-6 / Math.sqrt(3), 12);
    expect(layers).toBe(4);
  });

  it('knows nothing beside Rq where nothing is stated', () => {
    const texture = textureFrom({});
    for (const key of [
      'correlationLength',
      'developedAreaRatio',
      'rz',
      'lay',
      'nodule',
      'measured',
      'lengthConversion',
    ])
      expect(texture).not.toHaveProperty(key);
  });
});

describe('what no texture is', () => {
  const nodules = (radius: string, pitch: string) => `nodules: { radius: ${radius}, pitch: ${pitch} }`;
  const CASES: readonly (readonly [string, readonly string[], RegExp])[] = [
    [
      'a maximum height under twice Rq, exchanged',
      [`Rq: ${figure('2.4 um')}`, `Rz: ${figure('0.4 um')}`],
      /treated_face\.Rz\.value\n {2}found Rz "0\.4 um" with Rq "2\.4 um"; a maximum height is at least twice Rq\. Are the two exchanged\?$/,
    ],
    [
      'two maximum heights',
      [`Rz: ${figure('3 um')}`, `Sz: ${figure('3 um')}`],
      /found Rz and Sz together; one of Rz, Sz is stated\.$/,
    ],
    [
      'Sal and the length that follows from it',
      [RQ, `Sal: ${figure('1 um')}`, `correlation_length: ${figure('1 um')}`],
      /treated_face\.correlation_length\n {2}found Sal and correlation_length together/,
    ],
    ['a threshold of nothing', [RQ, 'Sal_threshold: 0.3'], /found Sal_threshold without Sal/],
    [
      'Sal of nothing',
      [RQ, `Sal: ${figure('0 um', '0 um')}`],
      /the autocorrelation length of a copper face lies between 0\.01 and 100 um/,
    ],
    [
      'Sal down to nothing',
      [RQ, `Sal: ${figure('1 um', '100 %')}`],
      /Sal\.spread\n {2}found "100 %"; with it the lower limit of "1 um" falls to 0 or below\.$/,
    ],
    [
      'an area ratio above 2000 %',
      [RQ, `Sdr: ${figure('2500 %')}`],
      /Sdr\.value\n {2}found "2500 %"; the developed area ratio/,
    ],
    [
      'an area ratio whose limit lies above',
      [RQ, `Sdr: ${figure('1900 %')}`],
      /Sdr\.spread\n {2}found an upper limit above 2000 %/,
    ],
    [
      'an area ratio with the % forgotten',
      [RQ, `Sdr: ${figure(12)}`],
      /Sdr\.value\n {2}found 12; a plain number is the ratio itself, so that this is 1200 %\. Did you mean 12 %\? Write 1200 % where it is meant\.$/,
    ],
    [
      'a length and an area of different textures',
      [RQ, `Sal: ${figure('20 um')}`, `Sdr: ${figure('90 %')}`],
      /Sdr\.value\n {2}found Sdr "90 %" with Sal "20 um"; a texture of this Rq and correlation length has an area ratio of some .* %; a factor of 20 beyond is no texture\. Are all units right\?/,
    ],
    [
      'nodules that overlap, by a diameter',
      [RQ, nodules(figure('0.5 um'), figure('0.6 um'))],
      /nodules\.pitch\.value\n {2}found "0\.6 um", for a radius of "0\.5 um"; nodules do not overlap: their pitch is at least two radii, 1\.00.µm\. Is the radius a diameter\?$/,
    ],
    [
      'nodules that overlap within the spread of the pitch',
      [RQ, nodules(figure('0.25 um', '0 um'), figure('0.52 um', '0.05 um'))],
      /nodules\.pitch\.spread\n {2}found a spread to a pitch of 0\.470.µm; with it nodules overlap/,
    ],
    [
      'nodules that overlap within the spread of the radius',
      [RQ, nodules(figure('0.25 um', '0.02 um'), figure('0.52 um', '0 um'))],
      /nodules\.radius\.spread\n {2}found a spread to a radius of 0\.270.µm/,
    ],
    [
      'too many nodules for an area',
      [RQ, `nodules: { radius: ${figure('0.3 um')}, per_area: ${figure('9 1/um2')} }`],
      /nodules\.per_area\.value\n {2}found "9 1\/um2", that is a pitch of 0\.333.µm, for a radius of "0\.3 um"/,
    ],
    [
      'nodules at a pitch and per area',
      [RQ, `nodules: { radius: ${figure('0.1 um')}, pitch: ${figure('0.3 um')}, per_area: ${figure('9 1/um2')} }`],
      /found pitch and per_area together/,
    ],
    ['nodules nowhere', [RQ, `nodules: { radius: ${figure('0.1 um')} }`], /nodules\n {2}found none of pitch, per_area/],
    ['a lay that is none', [RQ, 'lay: isotropc'], /one of isotropic, across, along\. Did you mean isotropic\?$/],
    ['a misspelt key', [RQ, `sdr: ${figure('12 %')}`], /found the unknown key "sdr"; .*Did you mean Sdr\?$/],
  ];

  it.each(CASES)('%s', (_name, keys, message) => {
    const texts = messagesOf(faced(...keys));
    expect(texts).toHaveLength(1);
    expect(texts[0]).toMatch(message);
  });

  it('leaves it to the estimates where lateral resolution or nodules explain the area', () => {
    // Rq 0.4 µm at a correlation length of 1.58 µm goes with an area ratio of 11 % (Gaussian) and more.
    for (const area of ['3 %', '60 %', '200 %'])
      expect(textureFrom(faced(RQ, `Sal: ${figure('2 um')}`, `Sdr: ${figure(area)}`)).developedAreaRatio).toBeDefined();
  });
});

/** A sine has Rq = amplitude/√2 exactly, and its autocorrelation cos kx falls to 1/e at acos(1/e)/k. */
const WAVE = 2e-6;
const AMPLITUDE = 0.5e-6;
const sine = (points: number, spacing: number, tilt = 0) =>
  Float64Array.from({ length: points }, (_, i) => AMPLITUDE * Math.sin((2 * Math.PI * i * spacing) / WAVE) + tilt * i);

function profileCsv(heights: Float64Array, head: readonly string[] = []): string {
  return [
    'texture,profile',
    'spacing,0.05 um',
    'unit,nm',
    ...head,
    'heights',
    [...heights].map((z) => (z * 1e9).toFixed(4)).join(','),
    '',
  ].join('\n');
}

const measuredFace = (rest = 'spread: 10 %', file = 'textures/a.csv') => faced(`measured: { file: ${file}, ${rest} }`);

describe('a measured texture', () => {
  const csv = profileCsv(sine(4000, 0.05e-6, 1e-10), ['instrument,"interferometer, 50x"']);
  const withProfile = (contents: Contents): Contents => ({ ...contents, 'textures/a.csv': csv });

  it('gives Rq, Rz and correlation length of a profile, with the spread stated and that of its length', () => {
    const contents = withProfile(
      measuredFace('spread: { minus: 10 %, plus: 20 % }, long_nesting_index: 20 um, document: TR-9'),
    );
    const { rq, rz, correlationLength, developedAreaRatio, stated, instrument, filter, conversion } =
      textureFrom(contents);
    // The Gaussian filter with nesting index 20 µm lets 1 − 2^(−(20/2)²) of a wave of 2 µm pass: all of it.
    expect(rq.value / (AMPLITUDE / Math.SQRT2)).toBeCloseTo(1, 3);
    expect(rq.minus / rq.value).toBeGreaterThan(0.1);
    expect(rq.plus - rq.minus).toBeCloseTo(0.1 * rq.value, 10);
    expect(rz!.value / (2 * AMPLITUDE)).toBeCloseTo(1, 2);
    expect(correlationLength!.value / ((WAVE * Math.acos(1 / Math.E)) / (2 * Math.PI))).toBeCloseTo(1, 2);
    expect(correlationLength).toMatchObject({
      provenance: { basis: 'measured', document: 'TR-9' },
      path: 'foils.yaml: kf-04.treated_face.measured.correlation_length',
    });
    expect(correlationLength!.minus / correlationLength!.value).toBeCloseTo(0.1, 12);
    expect(developedAreaRatio).toBeUndefined();
    expect(stated).toEqual({ parameter: 'Rq', value: rq.value });
    expect(conversion).toBeUndefined();
    expect(instrument).toBe('interferometer, 50x');
    expect(filter).toMatch(/no short filter; long filter, nesting index 20\.0.µm/);
  });

  it('has paths of its own for every figure, so that an offer on Rq moves nothing else', () => {
    const { rq, rz, correlationLength } = textureFrom(withProfile(measuredFace()));
    expect(new Set([rq.path, rz!.path, correlationLength!.path]).size).toBe(3);
  });

  it('says which file, how it was evaluated and what to know of it', () => {
    const contents = withProfile(measuredFace('spread: 10 %, short_nesting_index: 0.8 um, long_nesting_index: 20 um'));
    const { measured } = textureFrom(contents);
    const sha256 = createHash('sha256').update(csv).digest('hex');
    expect(measured).toMatchObject({
      file: 'textures/a.csv',
      sha256,
      kind: 'profile',
      shortNestingIndex: 0.8e-6,
      longNestingIndex: 20e-6,
    });
    expect(measured!.interval).toBeCloseTo(0.05e-6, 15);
    // 200 µm less half of the long nesting index at either end.
    expect(measured!.extent).toBeCloseTo(180e-6, 9);
    expect(measured!.remarks.join('\n')).toMatch(/least-squares line/);
    expect(measured!.remarks.join('\n')).toMatch(/Waves shorter than 0\.800.µm are not seen/);
    expect(measured!.remarks.join('\n')).toMatch(/nothing of the developed area ratio/);
    expect(packOf(load(contents)).inputs).toContainEqual({ path: 'textures/a.csv', sha256 });
  });

  it('keeps a piece of the evaluated heights for the drawing', () => {
    const { section } = textureFrom(withProfile(measuredFace('spread: 10 %, long_nesting_index: 20 um'))).measured!;
    expect(section!.heights.length).toBeLessThanOrEqual(400);
    expect(section!.heights.length * section!.interval).toBeGreaterThan(30e-6);
    expect(Math.max(...section!.heights)).toBeCloseTo(AMPLITUDE, 8);
    expect(section!.heights.every(Number.isFinite)).toBe(true);
  });

  it('gives the area ratio of a map as well, from X3P, and no Rz', () => {
    const [columns, rows, spacing] = [128, 128, 0.1e-6];
    const amplitude = 0.1e-6;
    const k = (2 * Math.PI) / 1.6e-6;
    const heights = Float64Array.from(
      { length: columns * rows },
      (_, i) => amplitude * Math.sin(k * (i % columns) * spacing) * Math.sin(k * Math.floor(i / columns) * spacing),
    );
    const contents = {
      ...measuredFace('spread: 0 %', 'textures/a.x3p'),
      'textures/a.x3p': writeZip(
        x3pFiles({ columns, rows, spacingX: spacing, spacingY: spacing, type: 'D', heights }).files,
      ),
    };
    const { rq, rz, developedAreaRatio, correlationLength, stated, conversion, measured } = textureFrom(contents);
    // An egg box has Sq of half its amplitude, and a mean square gradient of (ka)²/2.
    expect(rq.value / (amplitude / 2)).toBeCloseTo(1, 2);
    expect(stated.parameter).toBe('Sq');
    expect(conversion).toMatch(/equal to the stated Sq/);
    expect(rz).toBeUndefined();
    // Mean of √(1 + g) − 1 with g = (ka)²(cos²x sin²y + sin²x cos²y): g has the mean (ka)²/2 and the mean square 5(ka)⁴/16.
    const square = (k * amplitude) ** 2;
    expect(developedAreaRatio!.value / (square / 4 - (5 * square ** 2) / 128)).toBeCloseTo(1, 1.7);
    expect(correlationLength).toBeDefined();
    expect(measured).toMatchObject({ kind: 'map', file: 'textures/a.x3p' });
  });

  it('takes lay and nodules beside a measured file', () => {
    const texture = textureFrom(withProfile(faced('measured: { file: textures/a.csv, spread: 10 % }', 'lay: across')));
    expect(texture).toMatchObject({ lay: 'across', measured: { kind: 'profile' } });
  });

  it('serves the outer face of a board, relative to the file that names it, also where it is inherited', () => {
    const pack = packOf(
      load({
        ...edited(
          'boards/qs-1.yaml',
          'outer_face: { kind: foil }',
          'outer_face: { kind: plated, texture: { measured: { file: ../textures/a.csv, spread: 10 % } } }',
        ),
        'textures/a.csv': csv,
      }),
    );
    for (const board of pack.boards) {
      const { texture } = board.stackUp.strip.outerFace;
      expect(texture.measured!.file).toBe('textures/a.csv');
      expect(texture.rq.path).toBe('boards/qs-1.yaml: stack_up.strip.outer_face.texture.measured.Rq');
    }
  });

  it('goes to an audience without its hash', () => {
    const pack = packOf(load(withProfile(measuredFace())));
    const copy = packFor(pack, { id: 'partner', hide: ['cost'] });
    expect(copy.boards[0]!.stackUp.ground.dielectricFace.texture.measured!.sha256).toBe('not given in this copy');
    expect(copy.inputs).toContainEqual({ path: 'textures/a.csv', sha256: 'not given in this copy' });
    expect(JSON.stringify(copy)).not.toContain(createHash('sha256').update(csv).digest('hex'));
  });
});

describe('what no measured texture is', () => {
  const flat = profileCsv(new Float64Array(400));
  const good = profileCsv(sine(400, 0.05e-6));
  const tall = profileCsv(sine(400, 0.05e-6).map((z) => 400 * z));
  const CASES: readonly (readonly [string, Contents, RegExp])[] = [
    [
      'one beside a height, named with both places',
      {
        ...faced('measured: { file: textures/a.csv, spread: 10 % }', `Rq: ${figure('0.4 um')}`),
        'textures/a.csv': good,
      },
      /treated_face\.Rq\n {2}found measured and Rq together; the measured file "textures\/a\.csv" gives heights, length and area itself, .*\. Remove Rq, or remove measured\.$/,
    ],
    [
      'one beside a filter of its own',
      {
        ...faced('measured: { file: textures/a.csv, spread: 10 % }', 'filter: L-filter 25 um'),
        'textures/a.csv': good,
      },
      /treated_face\.filter\n {2}found measured and filter together/,
    ],
    ['a file that is not there', measuredFace(), /measured\.file\n {2}found "textures\/a\.csv"; a file that exists/],
    [
      'a file outside the root',
      measuredFace('spread: 10 %', '../../a.csv'),
      /measured\.file\n {2}found "\.\.\/\.\.\/a\.csv"; a reference stays under the root folder/,
    ],
    [
      'a file that is no table of heights, at its line',
      { ...measuredFace(), 'textures/a.csv': good.replace('unit,nm', 'unit,inches') },
      /^textures\/a\.csv:3:1 {2}unit\n {2}found "inches"/,
    ],
    [
      'filters longer than the profile',
      { ...measuredFace('spread: 10 %, long_nesting_index: 25 um'), 'textures/a.csv': good },
      /measured\.file\n {2}found "textures\/a\.csv"; with the filters stated, a profile needs 16 points or more, got 0\. State nesting indices below 19\.2.µm\.$/,
    ],
    [
      'filters the wrong way round',
      {
        ...measuredFace('spread: 10 %, short_nesting_index: 5 um, long_nesting_index: 0.5 um'),
        'textures/a.csv': good,
      },
      /long_nesting_index\n {2}found short_nesting_index "5 um" and long_nesting_index "0\.5 um"; the long nesting index lies above/,
    ],
    ['a flat surface', { ...measuredFace(), 'textures/a.csv': flat }, /found "textures\/a\.csv", a flat surface/],
    [
      'a face rougher than copper is',
      { ...measuredFace(), 'textures/a.csv': tall },
      /with Rq 14\d.*; the roughness of a copper face is at most 50\.0.µm.*Are the units/,
    ],
    [
      'no spread',
      { ...measuredFace('document: TR-1'), 'textures/a.csv': good },
      /treated_face\.measured\n {2}found no key "spread"; it is needed: How far other places/,
    ],
    [
      'a spread that leaves nothing',
      { ...measuredFace('spread: 120 %'), 'textures/a.csv': good },
      /measured\.spread\n {2}found a spread of 100 % or more/,
    ],
  ];

  it.each(CASES)('%s', (_name, contents, message) => {
    const texts = messagesOf(contents);
    expect(texts).toHaveLength(1);
    expect(texts[0]).toMatch(message);
  });
});

describe('any texture at all', () => {
  it('is a texture or has a message, never an exception', () => {
    const value = fc.constantFrom('0.1 um', '1 um', '40 um', '0 um', '12 %', '0.2', '9 1/um2', '~');
    const spread = fc.constantFrom('0 um', '0', '10 %', '100 %', '{ minus: 10 %, plus: 300 % }');
    const part = fc.tuple(value, spread).map(([v, s]) => `{ value: ${v}, spread: ${s}, basis: measured }`);
    const keys = ['Rq', 'Ra', 'Rz', 'Sz', 'Sal', 'correlation_length', 'Sdr'] as const;
    const lines = fc.tuple(
      ...keys.map((key) =>
        fc.option(
          part.map((text) => `${key}: ${text}`),
          { freq: 2 },
        ),
      ),
      fc.option(fc.constantFrom('Sal_threshold: 0.3', 'lay: along', 'filter: none')),
      fc.option(
        fc.tuple(part, part).map(([r, p]) => `nodules: { radius: ${r}, pitch: ${p} }`),
        { freq: 3 },
      ),
      fc.option(
        fc.tuple(part, part).map(([r, p]) => `nodules: { radius: ${r}, per_area: ${p} }`),
        { freq: 1 },
      ),
      fc.option(
        fc.constantFrom('measured: { file: textures/a.csv, spread: 10 % }', 'measured: { file: x, spread: 5 }'),
      ),
    );
    const csv = profileCsv(sine(400, 0.05e-6));
    fc.assert(
      fc.property(lines, (written) => {
        const given = written.filter((line) => line !== null);
        const result = load({ ...faced(...given), 'textures/a.csv': csv });
        if ('problems' in result) {
          expect(result.problems.length).toBeGreaterThan(0);
          return;
        }
        const {
          rq,
          correlationLength: l,
          developedAreaRatio: ratio,
          nodule,
        } = result.pack.boards[0]!.stackUp.strip.dielectricFace.texture;
        for (const figure of [rq, l, ratio, nodule?.radius, nodule?.pitch]) {
          if (!figure) continue;
          expect(figure.value - figure.minus).toBeGreaterThanOrEqual(0);
          expect(Number.isFinite(figure.plus)).toBe(true);
        }
        if (l) expect(l.value - l.minus).toBeGreaterThan(0);
        if (ratio) expect(ratio.value - ratio.minus).toBeGreaterThan(0);
        if (nodule)
          expect(nodule.pitch.value - nodule.pitch.minus).toBeGreaterThanOrEqual(2 * nodule.radius.value * (1 - 1e-8));
      }),
      { seed: 5, numRuns: 150 },
    );
  });
});
