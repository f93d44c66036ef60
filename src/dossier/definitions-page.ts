import { formatNumber } from '../quantity/index.js';
import { BOARD_STATUS_RULE, QUANTITIES } from '../verdict/index.js';
import { caution, cell, chapter, facts, list, prose, table } from './blocks.js';
import { cautionsChapter } from './chapter-record.js';
import { type PackInput, page } from './context.js';
import type { Chapter, DocumentPage } from './document.js';
import { DEFINITIONS, EVIDENCE, link } from './links.js';
import { MODEL_WORDS } from './model-words.js';
import { ENGINE_LIMITS, NOT_MODELLED } from './statements.js';

const gain = (): Chapter =>
  chapter(
    'gain',
    'Directivity, gain and realized gain',
    list([
      ['Directivity: radiation intensity in the direction of the maximum over the radiated power divided by 4π.'],
      [
        'Gain: directivity times the efficiency of the circuit, referred to the input of the feed network. Losses of the feed paths, copper, finish, dielectric and surface wave are in it; mismatch is not.',
      ],
      [
        'Realized gain: gain times 1 less the reflected over the incident power of all columns, driven with the weights of the feed.',
      ],
      [
        'Radiation efficiency: radiated power over the power accepted at the column ports. The power of the surface wave counts as lost, although the edge of a real board radiates part of it.',
      ],
      ['All are given in the direction of the maximum.'],
    ]),
  );

const reflection = (): Chapter =>
  chapter(
    'reflection',
    'Reflection, reference impedance and terminations',
    list([
      ['Plane of reflection: the true edge of the first patch of the column.'],
      [
        'Reference impedance: as each dossier states it, either the impedance of the feed line itself or a number in ohm.',
      ],
      ['Passive reflection: one column driven, every other column terminated in its reference impedance.'],
      [
        'Active reflection: all columns driven with the weights of the feed; reflected over incident wave at each driven column.',
      ],
      ['A level is 20 log10 of the magnitude; the largest over the columns counts.'],
    ]),
  );

const engines = (): Chapter =>
  chapter(
    'engines',
    'Two engines, and what network only means',
    list([
      [
        'Network: the columns as lines, steps and radiating edges in one circuit. A frequency takes milliseconds, so sweeps, temperatures, tolerances and allowances are solved by it.',
      ],
      [
        'Full wave: the currents on all metal of the columns, solved on the laminate with its surface wave. It runs in the nominal state of a board at the band edges and the band centre, and at further frequencies where a figure is near its limit.',
      ],
      [
        'Where the full wave ran, its value is the nominal figure. What the engines differ by is carried to other frequencies and states: reflections after the shift in frequency that best aligns them, all else along straight lines.',
      ],
      [
        'Network only: the full wave did not run on the board, for the reason that stands in the dossier. Such figures carry these words and a wider uncertainty.',
      ],
      [
        'Excitation: amplitude and phase of the current of each patch, integrated along the column. A column in one phase radiates broadside.',
      ],
      [
        'Coupling: wave that leaves one column while another is driven, over the wave driven. Isolation of groups: the least of its opposite over all pairs of two groups.',
      ],
      ['Both engines share limits that no comparison between them shows:'],
      ...ENGINE_LIMITS.map((line) => [line]),
    ]),
  );

const cuts = (): Chapter =>
  chapter(
    'cuts',
    'Axes, cuts and polarisation',
    list([
      [
        'x runs along the columns, away from the feed of a column that is not reversed; y across them, z away from the ground; broadside is z.',
      ],
      ['Elevation cut: the x-z plane, which is the E plane. Azimuth cut: the y-z plane, which is the H plane.'],
      ['Angles are counted from broadside, positive towards +x in elevation and towards +y in azimuth.'],
      ['The electric field is linear, along x; figures are of the co-polar field.'],
    ]),
  );

const beamFigures = ({ pack }: PackInput): Chapter =>
  chapter(
    'beam-figures',
    'Beam direction, beamwidth, sidelobes and masks',
    list([
      [
        'Beam direction: angle of the maximum of the cut. Positive tilt is towards +x, away from the feed. An upper limit applies to the magnitude, a lower limit to the signed angle.',
      ],
      ['Half-power beamwidth: between the two directions of the main lobe with half the power of the maximum.'],
      [
        'Sidelobe level: the highest lobe other than the main one, relative to the maximum of the same cut. A cut without another lobe has no sidelobe level, and a requirement on it is not evaluated.',
      ],
      ['Mask: highest level allowed in ranges of angle, relative to the maximum of the cut at the same frequency.'],
      [
        `Frequency step: at most ${formatNumber(pack.analysis.frequencyStep / 1e6, 0)} MHz over the operating band, both edges included. What happens between two steps is not seen.`,
      ],
    ]),
  );

const quantities = (): Chapter =>
  chapter(
    'quantities',
    'Quantities a requirement may limit',
    table(
      'quantity-table',
      'Quantities',
      ['Quantity|1.2', 'Unit|0.6', 'Cut|0.7', 'Definition|4'],
      QUANTITIES.map((q) => [
        cell(q.title),
        cell(q.unit === '' ? 'as declared' : q.unit),
        cell(q.cut === 'needed' ? 'named' : 'none'),
        cell(q.definition),
      ]),
    ),
  );

const statuses = (): Chapter =>
  chapter(
    'statuses',
    'Statuses',
    facts(
      'status-facts',
      [
        'Meets',
        { status: 'meets' },
        ' inside the limit under every estimate of the copper’s texture and with the whole adverse uncertainty',
      ],
      [
        'Undecided',
        { status: 'undecided' },
        ' the margin is below the uncertainty on one side of the limit or the other',
      ],
      [
        'Misses',
        { status: 'misses' },
        ' outside the limit under every estimate of the copper’s texture and with the whole favourable uncertainty',
      ],
      ['Not evaluated', { status: 'not evaluated' }, ' no value, with the reason; never read as meets'],
      [
        'Open until measured',
        { status: 'open until measured' },
        ' verified by test; the calculation is shown beside it and does not decide',
      ],
      ['Incomplete', { status: 'incomplete' }, ' of a board: a binding requirement was not evaluated'],
    ),
    prose(BOARD_STATUS_RULE),
    prose(
      'Missed by calculation and undecided are different: a missed requirement stays missed whatever the uncertainty hides, an undecided one may go either way.',
    ),
  );

const uncertaintyRule = (): Chapter =>
  chapter(
    'uncertainty-rule',
    'Worst value, margin and uncertainty',
    list(
      [
        [
          'The worst value over the band and temperature range of the requirement decides. A range that reaches outside what was evaluated makes the requirement not evaluated; it is never narrowed.',
        ],
        ['The margin is the distance of the nominal worst value to the limit, positive inside.'],
        [
          'Engine accuracy, by quantity, is taken at the value found; for figures of columns it is that of the full wave where it ran, with what carrying its differences leaves open, and otherwise that of the network, widened: ',
          link('engine accuracy', EVIDENCE, 'engine-accuracy'),
          '.',
        ],
        [
          'Texture of the copper: the worst value is found again under the low, middle and high estimate of every face. The spread is added linearly, because it is not a random error.',
        ],
        [
          'Tolerances: each declared spread is moved alone to both its limits and the worst value found again, wherever it then lies. A change for the better at both limits counts nothing against the board.',
        ],
        ['Engine accuracy and tolerances are combined by root sum of squares, separately against and for the board.'],
        [
          'Both bounds are built on the worst and the best value over the three estimates, so the choice of what is called nominal cannot turn undecided into meets.',
        ],
      ],
      true,
    ),
    prose(
      'The rule is a guard band on both sides of the limit in the sense of JCGM 106:2012 and ILAC-G8:09/2019. The uncertainty is a bound by argument, not a standard uncertainty with a coverage probability. A declared property carries none: it is the word of its document.',
    ),
  );

const limits = (): Chapter =>
  chapter(
    'limits',
    'Limits of the calculation',
    caution('What is not modelled', ...NOT_MODELLED.map((line) => [line])),
    list([
      [
        'A cover layer (solder mask, film) is computed for lines. Patches and columns under a cover layer are not modelled; figures of them are not evaluated.',
      ],
      ['Layers below the ground are drawn, not computed.'],
      [
        'Rq alone fixes neither loss nor phase of rough copper; the band from low to high estimate is shown and enters every verdict. Its edges are estimates, not bounds.',
      ],
      ['Tolerances are moved one at a time; joint effects and yield are not computed.'],
    ]),
  );

const roughnessModels = (): Chapter =>
  chapter(
    'roughness-models',
    'Models of rough copper',
    prose(
      'No model is the truth for every foil. The models stand side by side in each dossier; the band is built from what is known of the texture, by solved shapes and by the models that hold for them. ',
      'A formula that ends at a ceiling cannot rank foils beyond it and is never used to set a limit.',
    ),
    facts('roughness-model-facts', ...MODEL_WORDS),
  );

const words = (): Chapter =>
  chapter(
    'words',
    'Words',
    facts(
      'word-facts',
      ['Pack', 'boards judged together against one requirement set'],
      ['Dossier', 'everything about one board'],
      ['Evidence', 'methods, their sources and ranges, and the checks run'],
      ['Binding, target', 'a binding requirement decides; a target is shown'],
      ['Basis', 'how a figure is known: guaranteed, typical, measured or estimated'],
      ['Rq, Sq', 'root mean square height of a profile (ISO 21920-2), of a surface (ISO 25178-2)'],
      ['Rz', 'maximum height of a profile (ISO 21920-2); where it is not stated, 5.5 Rq is assumed and said so'],
      [
        'Autocorrelation length Sal',
        'shortest distance in which the autocorrelation of a surface falls to 0.2 (ISO 25178-2): small for fine texture',
      ],
      ['Correlation length', 'distance in which the autocorrelation falls to 1/e; from Sal for a Gaussian one'],
      [
        'Developed area ratio Sdr',
        'how much larger the surface is than its plan (ISO 25178-2); it grows with every finer filter',
      ],
      ['Nodule', 'grain of the treatment of a foil, taken as one of equal balls, stacked, on a square lattice'],
      ['Nesting index', 'cut-off of a texture filter (ISO 16610): S takes off what is finer, L what is longer'],
      ['K', 'loss of a rough face over that of a smooth one'],
      [
        'Band; low, middle, high',
        'estimates of a rough face for what is known of its texture; more knowledge narrows them. They are no bounds',
      ],
      ['Mean plane', 'plane of a rough face with as much copper above as below; thicknesses are between mean planes'],
      ['Electrostatic plane', 'plane at which the electric field ends on a rough face, a little above the mean plane'],
      [
        'Slow-wave length',
        'depth from the electrostatic plane to where the magnetic field ends; half a skin depth when smooth',
      ],
      ['Saturated', 'of a formula: within 5 % of its ceiling, where it no longer tells foils apart'],
      [
        'In-plane permittivity',
        'of the laminate along the board; the field at patch edges and line edges meets it, the rest the one through the thickness',
      ],
    ),
  );

export function definitionsPage(input: PackInput): DocumentPage {
  return page(input, {
    id: DEFINITIONS,
    kind: 'definitions',
    title: 'Definitions',
    subtitle: 'What every figure, status and word of this pack means',
    chapters: [
      gain(),
      reflection(),
      engines(),
      cuts(),
      beamFigures(input),
      quantities(),
      statuses(),
      uncertaintyRule(),
      roughnessModels(),
      limits(),
      words(),
      cautionsChapter(),
    ],
  });
}
