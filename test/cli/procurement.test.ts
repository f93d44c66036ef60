import { describe, expect, it } from 'vitest';
import { ANSWER_HEAD, PROCUREMENT } from '../manifest/procurement-fixture.js';
import { askingBuild } from './asking-build.js';

const answers = `${ANSWER_HEAD}\nA-permittivity,,2.8,3.2,3.1,"as, offered",,stripline,\nQ-1,,,,,,,,EUR 9.90 each\n`;

describe('a build of a pack that asks of suppliers', () => {
  it('writes page, PDF and table of each recipient, and the page of offers', async () => {
    const { outcome, revision } = await askingBuild({ covered: true }, PROCUREMENT, answers);
    expect(outcome.kind).toBe('built');
    for (const id of ['laminate', 'foil', 'fabrication']) {
      expect(revision.get(`supplier/${id}.html`)).toContain('Request for quotation NF-RFQ-7');
      expect(revision.get(`supplier/${id}.csv`)).toContain('NF-RFQ-7,A-');
      expect(revision.get(`pdf/supplier-${id}.pdf`)).toMatch(/^%PDF-1\.7/);
    }
    const offers = revision.get('offers.html')!;
    for (const said of [
      'wider than asked',
      'as, offered',
      'EUR 9.90 each',
      'no answer',
      'internal: not for suppliers',
      'href="supplier/foil.html"',
    ]) {
      expect(offers).toContain(said);
    }
    expect(revision.get('index.html')).toContain('href="offers.html"');
  });

  it('puts no answer onto any sheet', async () => {
    const { revision } = await askingBuild({ covered: true }, PROCUREMENT, answers);
    for (const [path, text] of revision) {
      if (path.startsWith('supplier/')) expect(text, path).not.toMatch(/EUR 9\.90|as, offered|stripline/);
    }
  });

  it('judges the boards again on what was offered', async () => {
    const one = PROCUREMENT.replaceAll('[qs-1, qs-2]', '[qs-1]').replace('[kf-04, kf-10]', '[kf-04]');
    const wish = { covered: false, requirements: ['r-match'] };
    const stages: string[] = [];
    const { outcome, revision } = await askingBuild(wish, one, answers, stages);
    expect(outcome.kind).toBe('built');
    expect(stages).toEqual(expect.arrayContaining(['searching allowances', 'judging the boards on what was offered']));
    const offers = revision.get('offers.html')!;
    const table = offers.slice(offers.indexOf('qs-1, status before and with the offer'));
    const levels = [...table.matchAll(/([+−]\d+\.\d+)\u00a0dB</g)].map(([, level]) => level);
    // Worst value and margin before, worst value and margin with the offer: another permittivity moves the resonance.
    expect(levels).toHaveLength(4);
    expect(levels[2]).not.toBe(levels[0]);
    expect(levels[3]).not.toBe(levels[1]);
    expect(offers).toContain('How far each item may go');
  });

  it('refuses answers that do not fit, at their place', async () => {
    const { outcome } = await askingBuild({ covered: true }, PROCUREMENT, `${ANSWER_HEAD}\nA-nothing,,,,,,,,\n`);
    expect(
      outcome.kind === 'bad input' && outcome.problems.map(({ file, line, column }) => [file, line, column]),
    ).toEqual([['laminate.csv', 2, 1]]);
  });
});
