import { describe, expect, it } from 'vitest';
import { formatProblem } from '../../src/manifest/index.js';
import { load, problemsOf } from './fixture.js';
import { ANSWER_HEAD, asking, askingPack } from './procurement-fixture.js';

const messages = (...change: Parameters<typeof asking>) => problemsOf(load(asking(...change))).map(formatProblem);

describe('procurement of a pack', () => {
  it('is absent where the pack names none', () => {
    const loaded = load();
    expect('pack' in loaded && loaded.pack.procurement).toBeUndefined();
  });

  it('is read into the model, in SI', () => {
    const { procurement } = askingPack();
    expect(procurement).toMatchObject({
      file: 'procurement.yaml',
      rfqNumber: 'NF-RFQ-7',
      replyDate: '2026-12-01',
      nda: 'NDA-5',
      panel: { width: 0.457, length: 0.61 },
      sampling: { confidence: 0.95, reliability: 0.9 },
      printAllowances: true,
      declare: [],
    });
    expect(procurement!.edgeSlope!.lower).toBeCloseTo((65 * Math.PI) / 180, 12);
    expect(procurement!.recipients.map(({ kind, quantities }) => [kind, quantities])).toEqual([
      ['laminate maker', ['10 panels']],
      ['foil maker', ['two rolls']],
      ['board fabricator', ['10 panels']],
    ]);
  });

  it('takes a cited plan instead of a sample size', () => {
    const change = [
      'sampling: { confidence: 0.95, reliability: 0.9 }',
      'sampling: { plan: "ISO 2859-1, level II" }',
    ] as const;
    expect(askingPack(...change).procurement!.sampling).toEqual({ plan: 'ISO 2859-1, level II' });
  });

  it.each([
    ['an unknown key', 'rfq_number:', 'rfq:', /unknown key "rfq"/],
    [
      'an unknown kind',
      'kind: foil_maker',
      'kind: foil',
      /found "foil"; one of laminate_maker, foil_maker, board_fabricator/,
    ],
    ['a panel without a unit', 'width: 457 mm', 'width: 457', /found 457; a length here carries its unit/],
    [
      'an unknown board',
      'boards: [qs-1, qs-2]\n    materials: [nl-30]',
      'boards: [qs-1, qs-3]\n    materials: [nl-30]',
      /^procurement\.yaml:15:20 {2}recipients\[0\]\.boards\[1\]\n {2}found the unknown board "qs-3".*Did you mean qs-1\?$/,
    ],
    [
      'a material that none of the boards uses',
      'materials: [nl-30]',
      'materials: [nl-31]',
      /^procurement\.yaml:16:17 {2}recipients\[0\]\.materials\[0\]\n {2}found "nl-31"; the boards of this recipient use nl-30\./,
    ],
    [
      'a board that uses none of the materials',
      'materials: [kf-04, kf-10]',
      'materials: [kf-04]',
      /recipients\[1\]\.boards\[1\]\n {2}found "qs-2"; a board that uses one of kf-04/,
    ],
    [
      'a maker without materials',
      '    materials: [nl-30]\n',
      '',
      /recipients\[0\]\.materials\n {2}found no key "materials"; a maker is asked for laminates/,
    ],
    [
      'a fabricator with materials',
      'kind: board_fabricator',
      'kind: board_fabricator\n    materials: [nl-30]',
      /found materials for a fabricator.*Remove materials\.$/,
    ],
    ['a recipient twice', 'id: foil\n', 'id: laminate\n', /recipients\[1\]\.id\n {2}found "laminate" a second time/],
    [
      'confidence without reliability',
      'confidence: 0.95, reliability: 0.9',
      'confidence: 0.95',
      /no key "reliability"; confidence and reliability stand together/,
    ],
    [
      'reliability without confidence',
      'confidence: 0.95, reliability: 0.9',
      'reliability: 0.9',
      /no key "confidence"; confidence and reliability stand together/,
    ],
    [
      'a plan beside a sample size',
      'confidence: 0.95, reliability: 0.9',
      'confidence: 0.95, plan: x',
      /confidence and plan together/,
    ],
    ['nothing about samples', '{ confidence: 0.95, reliability: 0.9 }', '{}', /none of reliability, plan/],
    [
      'a text that names a board',
      '[10 panels]',
      '[10 panels of QS-1]',
      /quantities\[0\]\n {2}found "10 panels of QS-1"; this is printed on sheets, and "qs-1" is the name of a board\./,
    ],
    [
      'a text that names another recipient',
      'Measured values with each lot.',
      'As Stourbeck Circuits does.',
      /"Stourbeck Circuits" is the name of a recipient/,
    ],
    ['a text that names a material', 'nda: NDA-5', 'nda: NDA-5 on NL-30', /"NL-30" is the name of a material/],
    [
      'a text that names the pack',
      'address: 1 Test Lane',
      'address: "Quillback side radar, two candidate boards"',
      /is the name of the pack/,
    ],
    [
      'answers that are not there',
      'materials: [nl-30]',
      'materials: [nl-30]\n    answers: none.csv',
      /a file that exists; there is no none\.csv/,
    ],
    [
      'answers outside the root',
      'materials: [nl-30]',
      'materials: [nl-30]\n    answers: ../x.csv',
      /stays under the root folder/,
    ],
  ] as const)('refuses %s', (_, from, to, message) => {
    expect(messages(from, to).join('\n')).toMatch(message);
  });

  it('takes a board whose id only begins like a word of a text', () => {
    expect(() => askingPack('[10 panels]', '[10 panels, qs-10]')).not.toThrow();
  });
});

describe('a returned sheet', () => {
  const row = (line: string) => `${ANSWER_HEAD}\r\n${line}\r\n`;

  it('is read in SI, with and without a byte order mark', () => {
    const text = row('A-laminate-thickness,um,120,130,126,thicker,,cross-section,');
    for (const answers of [text, `\ufeff${text}`]) {
      const [answer] = askingPack('', '', answers).procurement!.recipients[0].answers!.rows;
      expect(answer).toEqual({
        item: 'A-laminate-thickness',
        line: 2,
        guaranteedLower: 120e-6,
        guaranteedUpper: 130e-6,
        typical: 126e-6,
        alternative: 'thicker',
        notOffered: false,
        method: 'cross-section',
        asked: {},
      });
    }
  });

  it('takes the apostrophe off that kept a cell from being a formula', () => {
    const answers = row("S-rohs,,,,,,,,'=none");
    expect(askingPack('', '', answers).procurement!.recipients[0].answers!.rows[0].declaration).toBe('=none');
  });

  it('counts among the inputs', () => {
    expect(askingPack('', '', row('A-permittivity,,,,,,x,,')).inputs.map(({ path }) => path)).toContain('laminate.csv');
  });

  it.each([
    [
      'an unknown item',
      'A-permitivity,,2.9,3.1,,,,,',
      /^laminate\.csv:2:1 {2}\[0\]\.item\n {2}found "A-permitivity"; the items of this sheet are .*Did you mean A-permittivity\?$/,
    ],
    [
      'a word for a number',
      'A-permittivity,,about 2.9,3.1,,,,,',
      /^laminate\.csv:2:17 {2}\[0\]\.guaranteed_lower\n {2}found "about 2.9"; a plain number/,
    ],
    ['a decimal comma', 'A-permittivity,,"2,9",3.1,,,,,', /found "2,9"; a plain number/],
    [
      'another unit',
      'A-laminate-thickness,mm,0.12,0.13,,,,,',
      /\.unit\n {2}found "mm"; A-laminate-thickness is asked and answered in um/,
    ],
    ['no unit', 'A-laminate-thickness,,120,130,,,,,', /found no unit; A-laminate-thickness is asked/],
    [
      'limits in the wrong order',
      'A-permittivity,,3.1,2.9,,,,,',
      /\.guaranteed_upper\n {2}found "2.9"; it lies above guaranteed_lower/,
    ],
    ['one limit of two', 'A-permittivity,,,3.1,,,,,', /a guaranteed range has a lower limit as well/],
    ['a lower limit alone', 'A-permittivity,,2.9,,,,,,', /a guaranteed range has an upper limit as well/],
    [
      'a typical value outside',
      'A-permittivity,,2.9,3.1,3.2,,,,',
      /\.typical\n {2}found "3.2"; a typical value lies within/,
    ],
    ['figures of what is not offered', 'A-permittivity,,2.9,3.1,,,yes,,', /an item that is not offered has no figures/],
    ['an odd mark', 'A-permittivity,,,,,,perhaps,,', /\.not_offered\n {2}found "perhaps"; one of yes, no/],
    ['a negative thickness', 'A-laminate-thickness,um,-5,130,,,,,', /this is at least 0/],
    ['a permittivity below one', 'A-permittivity,,0.5,3.1,,,,,', /a relative permittivity is at least 1/],
    ['a figure where words are due', 'S-rohs,,1,2,,,,,', /this item is answered in words/],
    [
      'an item twice',
      'A-permittivity,,,,,,yes,,\r\nA-permittivity,,,,,,yes,,',
      /^laminate\.csv:3:1 .*\n {2}found "A-permittivity" a second time.*the first is in line 2\.$/,
    ],
  ])('refuses %s, at its cell', (_, line, message) => {
    expect(messages('', '', row(line)).join('\n')).toMatch(message);
  });

  it.each([
    ['semicolons', ANSWER_HEAD.replaceAll(',', ';'), /columns parted by semicolons.*Save the table with commas/],
    ['a missing column', ANSWER_HEAD.replace('typical,', ''), /no column "typical"/],
    ['an unknown column', `${ANSWER_HEAD},prise`, /the unknown column "prise"/],
    ['a column twice', `${ANSWER_HEAD},method`, /the column "method" a second time/],
    [
      'another request',
      `rfq,${ANSWER_HEAD}\r\nOTHER-9,A-permittivity,,,,,,yes,,`,
      /found "OTHER-9"; the sheet answers NF-RFQ-7/,
    ],
  ])('refuses %s', (_, text, message) => {
    expect(messages('', '', `${text}\r\n`).join('\n')).toMatch(message);
  });
});
