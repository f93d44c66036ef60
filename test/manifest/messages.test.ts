import { describe, expect, it } from 'vitest';
import { formatProblem } from '../../src/manifest/index.js';
import { edited, FIXTURE_FILES, fixtureText, load, problemsOf } from './fixture.js';

/** Replaces one passage and expects just this message; `@` stands for the place where the passage begins. */
const CASES: readonly (readonly [name: string, file: string, from: string, to: string, message: RegExp])[] = [
  [
    'an unknown key, with the near one',
    'boards/qs-1.yaml',
    '  pitch:',
    '  pich:',
    /^boards\/qs-1\.yaml:26:3 {2}array\.pich\n {2}found the unknown key "pich"; the keys here are columns, pitch, .*\. Did you mean pitch\?$/,
  ],
  [
    'the wrong unit, with the right one',
    'boards/qs-1.yaml',
    'value: 127 um',
    'value: 127 mm',
    /^boards\/qs-1\.yaml:17:25 {2}stack_up\.laminate\.thickness\.value\n {2}found "127 mm"; the thickness of a laminate lies between 0\.02 and 3 mm\. Did you mean 127 um\?$/,
  ],
  [
    'a bare number',
    'boards/qs-1.yaml',
    'value: 127 um',
    'value: 127',
    /found 127; a length here carries its unit: .*Did you mean 127 um\?$/,
  ],
  [
    'a negative thickness',
    'boards/qs-1.yaml',
    'value: 127 um',
    'value: -127 um',
    /found "-127 um"; .*Did you mean 127 um\?$/,
  ],
  ['a unit in the wrong case', 'boards/qs-1.yaml', 'low: 76.1 GHz', 'low: 76.1 ghz', /Did you mean 76\.1 GHz\?$/],
  [
    'an impossible band',
    'boards/qs-1.yaml',
    'low: 76.1 GHz',
    'low: 761 GHz',
    /the frequency of a board lies between 1 and 300 GHz/,
  ],
  [
    'an unknown foil',
    'boards/qs-1.yaml',
    'foil: kf-04',
    'foil: kf-4',
    /stack_up\.strip\.foil\n {2}found the unknown foil "kf-4"; the foil ids of the pack are: kf-04, kf-10\. Did you mean kf-04\?$/,
  ],
  [
    'an unknown laminate',
    'boards/qs-1.yaml',
    'material: nl-30',
    'material: xx-99',
    /the unknown laminate "xx-99"; the laminate ids of the pack are: nl-30\.$/,
  ],
  [
    'an unknown finish',
    'boards/qs-2.yaml',
    'finish: nickel-gold',
    'finish: nickel_gold',
    /an id holds lower-case letters.* Did you mean nickel-gold\?$/,
  ],
  [
    'a missing key, at its parent',
    'boards/qs-1.yaml',
    '  pitch: 2.15 mm\n',
    '',
    /^boards\/qs-1\.yaml:24:1 {2}array\n {2}found no key "pitch"; it is needed: Distance between/,
  ],
  [
    'an empty value',
    'boards/qs-1.yaml',
    'pitch: 2.15 mm',
    'pitch:',
    /^boards\/qs-1\.yaml:26:3 {2}array\.pitch\n {2}found an empty value;/,
  ],
  ['a map where text is due', 'boards/qs-1.yaml', 'foil: kf-04', 'foil: { id: kf-04 }', /found a map; an id holds/],
  [
    'text where a map is due',
    'boards/qs-1.yaml',
    'outer_face: { kind: foil }',
    'outer_face: foil',
    /found "foil"; a map with the keys kind, texture\.$/,
  ],
  ['one value where a list is due', 'boards/qs-1.yaml', '[0.7, 1, 0.7]', '1', /found 1; a list\. Write \[1\]\.$/],
  ['yes for true', 'foils.yaml', 'invented: true', 'invented: yes', /found "yes"; true or false\. Write true\.$/],
  ['a number for text', 'pack.yaml', 'revision: A', 'revision: 1.10', /found 1\.10; .* Write it in quotes: "1\.10"\.$/],
  [
    'text for a number',
    'laminates.yaml',
    'value: 3.00',
    'value: "3.00"',
    /found "3\.00"; a plain number\. Write 3 without quotes\.$/,
  ],
  ['a fraction for a count', 'boards/qs-1.yaml', 'columns: 3', 'columns: 2.5', /found 2\.5; a whole number/],
  ['a permittivity out of range', 'laminates.yaml', 'value: 3.00', 'value: 300', /found 300; a number from 1 to 20\.$/],
  ['infinity', 'laminates.yaml', 'value: 3.00', 'value: .inf', /found \.inf; a plain number/],
  [
    'a loss tangent out of range',
    'laminates.yaml',
    'value: 0.0015',
    'value: 0.15',
    /found 0\.15; a number from 0 to 0\.1\.$/,
  ],
  [
    'a missing spread',
    'laminates.yaml',
    'spread: 0.05, ',
    '',
    /laminates\[0\]\.permittivity\n {2}found no key "spread"/,
  ],
  [
    'a missing basis',
    'laminates.yaml',
    'basis: guaranteed, ',
    '',
    /laminates\[0\]\.permittivity\n {2}found no key "basis"/,
  ],
  [
    'a misspelt basis',
    'laminates.yaml',
    'basis: guaranteed',
    'basis: garanteed',
    /one of guaranteed, typical, measured, estimated\. Did you mean guaranteed\?$/,
  ],
  [
    'a negative spread',
    'laminates.yaml',
    'spread: 0.05',
    'spread: -0.05',
    /found -0\.05; a spread here is a number, at least 0, or % of the value\.$/,
  ],
  [
    'a spread in another dimension',
    'boards/qs-1.yaml',
    'spread: 8 um',
    'spread: 8 GHz',
    /found "8 GHz"; a length here carries its unit: .*, or % of the value\.$/,
  ],
  [
    'a spread beyond zero',
    'boards/qs-1.yaml',
    'spread: 8 um',
    'spread: 800 um',
    /thickness\.spread\n {2}found "800 um"; with it the lower limit of "127 um" falls to 0 or below\.$/,
  ],
  [
    'a permittivity below one within its spread',
    'laminates.yaml',
    'spread: 0.05',
    'spread: 90 %',
    /found "90 %"; with it the lower limit of "3\.00" falls below 1\.$/,
  ],
  ['half a spread', 'laminates.yaml', '{ minus: 0.0002, plus: 0.0004 }', '{ minus: 0.0002 }', /found no key "plus"/],
  [
    'a design value without its foil',
    'laminates.yaml',
    'kind: bulk',
    'kind: design',
    /a design value names the foil and the thickness/,
  ],
  [
    'a bulk value with a foil',
    'laminates.yaml',
    'kind: bulk',
    'kind: bulk, fitted_on: { foil: kf-04, thickness: 127 um }',
    /found fitted_on with kind bulk/,
  ],
  [
    'water that changes nothing',
    'laminates.yaml',
    '    declared:',
    '    water: { uptake: { value: 0.04 %, spread: 50 %, basis: typical } }\n    declared:',
    /laminates\[0\]\.water\n {2}found water that changes nothing; permittivity_per_share, loss_tangent_per_share or both are needed\.$/,
  ],
  [
    'a water uptake with the % forgotten',
    'laminates.yaml',
    '    declared:',
    '    water: { uptake: { value: 4, spread: 50 %, basis: typical }, permittivity_per_share: 8 }\n    declared:',
    /water\.uptake\.value\n {2}found 4; the water uptake of a laminate lies between 0 and 0\.05\. Did you mean 4 %\?$/,
  ],
  [
    'a roughness model that is none',
    'pack.yaml',
    'gradient',
    'gradiant',
    /one of band, hammerstad, groiss, gradient\. Did you mean gradient\?$/,
  ],
  [
    'a full wave that is neither on nor off',
    'pack.yaml',
    '  frequency_step',
    '  full_wave: yes\n  frequency_step',
    /analysis\.full_wave\n {2}found "yes"; one of on, off\.$/,
  ],
  [
    'two height parameters',
    'foils.yaml',
    'Ra: { value: 0.25 um',
    'Rq: { value: 0.3 um, spread: 0 um, basis: typical }\n      Ra: { value: 0.25 um',
    /found Rq and Ra together; one of Rq, Sq, Ra, Sa is stated; Rz or Sz may stand beside it\.$/,
  ],
  [
    'no height parameter',
    'foils.yaml',
    'Ra: { value: 0.25 um, spread: 0.05 um, basis: typical, document: KF-DS-10, revision: B, date: 2026-01-19 }',
    'filter: none',
    /foils\[1\]\.untreated_face\n {2}found none of Rq/,
  ],
  [
    'a plated face without texture',
    'boards/qs-1.yaml',
    'kind: foil',
    'kind: plated',
    /found no texture; a plated outer face has a texture of its own/,
  ],
  ['a misspelt kind of face', 'boards/qs-1.yaml', 'kind: foil', 'kind: micro-etched', /Did you mean micro_etched\?$/],
  [
    'a band upside down',
    'boards/qs-1.yaml',
    'low: 76.1 GHz, high: 76.9 GHz',
    'low: 76.9 GHz, high: 76.1 GHz',
    /found low "76\.9 GHz" and high "76\.1 GHz"; high lies above low\.$/,
  ],
  [
    'temperatures out of order',
    'boards/qs-1.yaml',
    'nominal: 23 degC',
    'nominal: 110 degC',
    /found nominal "110 degC" and high "105 degC"; high lies above nominal or equals it\.$/,
  ],
  [
    'too few amplitudes',
    'boards/qs-1.yaml',
    '[0.7, 1, 0.7]',
    '[0.7, 1]',
    /feed\.amplitude\n {2}found 2 entries; one per column, 3 here\.$/,
  ],
  [
    'too few phases',
    'boards/qs-1.yaml',
    '[0 deg, 0 deg, 0 deg]',
    '[0 deg]',
    /feed\.phase\n {2}found 1 entry; one per column, 3 here\.$/,
  ],
  ['amplitudes all zero', 'boards/qs-1.yaml', '[0.7, 1, 0.7]', '[0, 0, 0]', /at least one column is driven/],
  [
    'a negative amplitude',
    'boards/qs-1.yaml',
    '[0.7, 1, 0.7]',
    '[-0.7, 1, 0.7]',
    /feed\.amplitude\[0\]\n {2}found -0\.7; a number from 0 to/,
  ],
  [
    'a forgotten mirror',
    'boards/qs-1.yaml',
    ', mirrored: true',
    '',
    /array\.patches\.widths\n {2}found 2 entries; 4 here: one per patch\. Did you forget mirrored: true\?$/,
  ],
  [
    'width and widths',
    'boards/qs-1.yaml',
    '{ count: 4,',
    '{ count: 4, width: 1 mm,',
    /array\.patches\.widths\n {2}found width and widths together/,
  ],
  [
    'too few links',
    'boards/qs-1.yaml',
    'links: { width: 0.15 mm, length: 1.24 mm }',
    'links: [{ width: 0.15 mm, length: 1.24 mm }]',
    /found 1 entries; 3 here: one fewer than the 4 patches\.$/,
  ],
  [
    'no links',
    'boards/qs-1.yaml',
    '  links: { width: 0.15 mm, length: 1.24 mm }\n',
    '',
    /found no links; 4 patches have 3 links between them\.$/,
  ],
  [
    'columns that overlap',
    'boards/qs-1.yaml',
    'pitch: 2.15 mm',
    'pitch: 0.9 mm',
    /found "0\.9 mm"; columns of patches 1\.00.mm wide overlap at this pitch\.$/,
  ],
  [
    'a staggered list too long',
    'boards/qs-1.yaml',
    'feed:\n',
    '  offset_x: [0 mm, 1 mm, 0 mm, 1 mm]\nfeed:\n',
    /array\.offset_x\n {2}found a list of 4|array\.offset_x\n {2}found 4 entries; one per column, 3 here\.$/,
  ],
  [
    'a path that is loss and line',
    'boards/qs-1.yaml',
    '  path:\n',
    '  path:\n    line: { width: 0.15 mm, length: 12 mm }\n',
    /found loss and line together/,
  ],
  [
    'a sweep without end',
    'boards/qs-1.yaml',
    'low: 76.1 GHz, high: 76.9 GHz',
    'low: 1 GHz, high: 300 GHz',
    /band\n {2}found 2990 steps; with the frequency step of the pack, 100\.00.MHz, the band has at most 2000 steps\.$/,
  ],
  [
    'a tiny frequency step',
    'pack.yaml',
    'frequency_step: 100 MHz',
    'frequency_step: 0.1 MHz',
    /the frequency step lies between 1 and 5000 MHz/,
  ],
  [
    'a limit in the wrong unit',
    'requirements.yaml',
    'at_least: 13 dBi',
    'at_least: 13 dB',
    /requirements\[0\]\.limit\.at_least\n {2}found "13 dB"; .*Did you mean 13 dBi\?$/,
  ],
  [
    'a limit without unit',
    'requirements.yaml',
    'at_most: -12 dB',
    'at_most: -12',
    /found -12; a level here carries its unit: dB; .*Did you mean -12 dB\?$/,
  ],
  [
    'a reflection with a lost sign',
    'requirements.yaml',
    'at_most: -12 dB',
    'at_most: 12 dB',
    /a reflection lies between -80 and 0 dB\. Did you mean -12 dB\?$/,
  ],
  [
    'two limits',
    'requirements.yaml',
    'at_least: 13 dBi',
    'at_least: 13 dBi, at_most: 20 dBi',
    /found at_least and at_most together/,
  ],
  [
    'no limit',
    'requirements.yaml',
    '    limit: { at_least: 13 dBi }\n',
    '',
    /found no key "limit"; realized_gain has a limit/,
  ],
  [
    'no cut',
    'requirements.yaml',
    '    cut: azimuth\n',
    '',
    /found no key "cut"; pattern_mask is of one cut: azimuth or elevation\.$/,
  ],
  [
    'a cut too many',
    'requirements.yaml',
    '    quantity: reflection\n',
    '    quantity: reflection\n    cut: azimuth\n',
    /requirements\[1\]\.cut\n {2}found cut for reflection; .* Remove cut\.$/,
  ],
  [
    'a mask piece upside down',
    'requirements.yaml',
    'from: 50 deg, to: 80 deg',
    'from: 80 deg, to: 50 deg',
    /to lies above from\.$/,
  ],
  [
    'mask pieces that overlap',
    'requirements.yaml',
    'from: 50 deg, to: 80 deg',
    'from: -60 deg, to: 80 deg',
    /found "-60 deg"; pieces of a mask do not overlap\.$/,
  ],
  [
    'words as a numeric limit',
    'requirements.yaml',
    'at_most: 12 weeks',
    'at_most: soon',
    /found "soon"; a number with the unit of the property\. For words write allowed: \[\.\.\.\]\.$/,
  ],
  [
    'a quantity that is none',
    'requirements.yaml',
    'quantity: reflection',
    'quantity: relfection',
    /one of gain, .* Did you mean reflection\?$/,
  ],
  [
    'a requirement id twice',
    'requirements.yaml',
    'id: r-match',
    'id: r-gain',
    /found "r-gain" a second time; an id stands once in a set\.$/,
  ],
  [
    'an id that is none',
    'boards/qs-2.yaml',
    'id: qs-2',
    'id: QS 2',
    /found "QS 2"; an id holds .* Did you mean qs-2\?$/,
  ],
  [
    'a revision that climbs',
    'pack.yaml',
    'revision: A',
    'revision: ../A',
    /found "\.\.\/A"; a revision holds letters and digits/,
  ],
  ['a day that is none', 'pack.yaml', '2026-11-02', '2026-02-30', /found "2026-02-30"; a date of the calendar/],
  ['a misspelt status', 'pack.yaml', 'for_review', 'for review', /Did you mean for_review\?$/],
  [
    'an empty list of boards',
    'pack.yaml',
    'boards:\n  - boards/qs-1.yaml\n  - boards/qs-2.yaml\n',
    'boards: []\n',
    /^pack\.yaml:11:9 {2}boards\n {2}found an empty list; at least 1 here\.$/,
  ],
  [
    'a file that is not there',
    'pack.yaml',
    'boards/qs-2.yaml',
    'boards/qs-3.yaml',
    /^pack\.yaml:13:5 {2}boards\[1\]\n {2}found "boards\/qs-3\.yaml"; a file that exists/,
  ],
  [
    'a reference outside the root',
    'pack.yaml',
    'boards/qs-2.yaml',
    '../other/qs-2.yaml',
    /found "\.\.\/other\/qs-2\.yaml"; a reference stays under the root folder\. Widen the root with --root/,
  ],
  ['an absolute reference', 'pack.yaml', 'boards/qs-2.yaml', '/etc/passwd', /no absolute paths/],
  ['a reference with backslashes', 'pack.yaml', 'boards/qs-2.yaml', 'boards\\qs-2.yaml', /Write boards\/qs-2\.yaml\.$/],
  [
    'a file listed twice',
    'pack.yaml',
    'boards/qs-2.yaml',
    './boards/qs-1.yaml',
    /found "\.\/boards\/qs-1\.yaml" a second time; a file is listed once\.$/,
  ],
  [
    'a board id twice',
    'boards/qs-2.yaml',
    'id: qs-2',
    'id: qs-1',
    /found "qs-1" a second time; the boards of a pack have one id each; the first is in boards\/qs-1\.yaml\.$/,
  ],
  ['a library id twice', 'foils.yaml', 'id: kf-10', 'id: kf-04', /foils\[1\]\.id\n {2}found "kf-04" a second time/],
  [
    'an unknown parent',
    'boards/qs-2.yaml',
    'based_on: qs-1',
    'based_on: qs-11',
    /^boards\/qs-2\.yaml:4:11 {2}based_on\n {2}found the unknown board "qs-11"; .* Did you mean qs-1\?$/,
  ],
  ['a board based on itself', 'boards/qs-2.yaml', 'based_on: qs-1', 'based_on: qs-2', /found the circle qs-2 → qs-2/],
  ['escape sequences in a title', 'pack.yaml', 'title: Quillback', 'title: "\\e[2J', /./],
  [
    'a control character in a title',
    'pack.yaml',
    'title: Quillback side radar, two candidate boards',
    'title: "a\\u202eb"',
    /found "a\\u202eb"; text without control characters/,
  ],
];

describe('messages', () => {
  it.each(CASES)('%s', (_name, file, from, to, message) => {
    const texts = problemsOf(load(edited(file, from, to))).map(formatProblem);
    const matching = texts.filter((text) => message.test(text));
    expect(matching, texts.join('\n')).not.toHaveLength(0);
    for (const text of texts) {
      expect(text).toMatch(/^[^\n]+:\d+:\d+( {2}[^\n]+)?\n {2}found [^\n]+; [^\n]+$/);
      // biome-ignore lint/suspicious/noControlCharactersInRegex: control characters are what is looked for
      expect(text).not.toMatch(/[\u0000-\u0009\u000b-\u001f\u007f-\u009f]/);
    }
  });

  it('come alone: one fault, one message', () => {
    const cascades = new Set([
      'an unknown parent',
      'a board id twice',
      'a library id twice',
      'an empty list of boards',
      'a file listed twice',
      'escape sequences in a title',
    ]);
    for (const [name, file, from, to] of CASES) {
      if (cascades.has(name)) continue;
      const texts = problemsOf(load(edited(file, from, to))).map(formatProblem);
      // A faulty parent is reported where it stands; a board based on it repeats only what it inherits from there.
      expect(texts.length, `${name}\n${texts.join('\n')}`).toBe(1);
    }
  });

  it('come all at once, sorted by place, over all files', () => {
    const problems = problemsOf(
      load({
        ...edited('foils.yaml', 'conductivity:', 'conductvity:'),
        ...edited('laminates.yaml', 'value: 3.00', 'value: 300'),
        ...edited('boards/qs-1.yaml', 'low: 76.1 GHz', 'low: 76.1'),
        ...edited('requirements.yaml', 'at_least: 13 dBi', 'at_least: 13 dB'),
        ...edited('pack.yaml', 'status: for_review', 'status: signed'),
      }),
    );
    expect(problems.map((p) => p.file)).toEqual([
      'boards/qs-1.yaml',
      'foils.yaml',
      'laminates.yaml',
      'pack.yaml',
      'requirements.yaml',
    ]);
  });

  it('names the file that holds an inherited fault', () => {
    const problems = problemsOf(load(edited('boards/qs-1.yaml', '[0.7, 1, 0.7]', '[0.7, 1]')));
    expect(problems.map((p) => p.file)).toEqual(['boards/qs-1.yaml']);
  });

  it('do not blame boards for ids of a library that could not be read', () => {
    const problems = problemsOf(load({ 'foils.yaml': 'foils: [\n' }));
    expect(problems.map((p) => p.file)).toEqual(['foils.yaml']);
  });

  it('an empty pack names every key that it needs', () => {
    const found = problemsOf(load({ 'pack.yaml': '{}' })).map((p) => p.found);
    expect(found).toContain('no key "boards"');
    expect(found).toContain('no key "requirements"');
    expect(found).toHaveLength(12);
    expect(problemsOf(load({ 'pack.yaml': '' })).map((p) => p.found)).toEqual(['an empty file']);
  });

  it('say which file is missing, refused or outside', () => {
    expect(problemsOf(load({}, 'nothing.yaml'))).toMatchObject([{ file: 'nothing.yaml', line: 1, column: 1 }]);
    expect(problemsOf(load({}, '../pack.yaml'))).toMatchObject([
      { allowed: 'a reference stays under the root folder' },
    ]);
  });

  it('every example file survives the loss of any one line with a pack or with messages', () => {
    for (const file of FIXTURE_FILES) {
      const lines = fixtureText(file).split('\n');
      for (let i = 0; i < lines.length; i++) {
        const result = load({ [file]: lines.filter((_, j) => j !== i).join('\n') });
        if ('problems' in result) expect(result.problems.length, `${file} without line ${i + 1}`).toBeGreaterThan(0);
      }
    }
  });
});
