import type { Dimension } from '../quantity/index.js';
import type { BoardDocument } from './documents/board-document.js';
import type { FigureDocument } from './documents/fields.js';
import type { Measurements } from './evaluated-texture.js';
import { figureOf, type MakeFigure, si } from './figures.js';
import { guessedColumns } from './guessed-columns.js';
import type { Board, Finish, Foil, Laminate, StackUp, Texture } from './model.js';
import { dotted, type Path } from './problem.js';
import { drawnColumns, groupsOf, scanOf, sizedForOf } from './resolve-array.js';
import { feedOf, networkOf } from './resolve-feed.js';
import { declaredOf } from './resolve-library.js';
import { textureOf } from './resolve-texture.js';
import type { Transitions } from './transitions.js';
import { type Node, nodeAt } from './tree.js';

export interface Libraries {
  readonly laminates: ReadonlyMap<string, Laminate>;
  readonly foils: ReadonlyMap<string, Foil>;
  readonly finishes: ReadonlyMap<string, Finish>;
  /** Measured files of textures of their own. */
  readonly measurements: Measurements;
  /** Two-port files of feed networks. */
  readonly transitions: Transitions;
}

/** A complete board as read: its own keys over those of the boards it is based on. */
export interface BoardInput {
  readonly root: Node;
  readonly file: string;
  readonly basedOn: readonly string[];
  readonly overrides: readonly string[];
  readonly lineage: NonNullable<Board['lineage']>;
}

function found<T>(map: ReadonlyMap<string, T>, id: string): T {
  const item = map.get(id);
  if (item === undefined) throw new Error(`unchecked id ${id} reached the model`);
  return item;
}

/** A checked board document as the model holds it. */
export function boardOf(doc: BoardDocument, input: BoardInput, libraries: Libraries): Board {
  // An inherited figure names the file in which it stands.
  const where = (path: Path) => `${nodeAt(input.root, path)?.mark.source.path ?? input.file}: ${dotted(path)}`;
  const figure = (figureDoc: FigureDocument, dimension: Dimension | 'number', path: Path) =>
    figureOf(figureDoc, dimension, where(path));
  const stackUp = stackUpOf(doc.stack_up, libraries, figure, where);
  const sizedFor = doc.array.sized_for && sizedForOf(doc.array.sized_for);
  return {
    id: doc.id,
    title: doc.title,
    ...(doc.description === undefined ? {} : { description: doc.description }),
    basedOn: input.basedOn,
    file: input.file,
    overrides: input.overrides,
    lineage: input.lineage,
    stackUp,
    columns: sizedFor === undefined ? drawnColumns(doc.array) : guessedColumns(doc.array, sizedFor, stackUp),
    ...(doc.array.retune === undefined ? {} : { retune: doc.array.retune }),
    ...(sizedFor === undefined ? {} : { sizedFor }),
    pitch: si(doc.array.pitch, 'length'),
    feed: feedOf(doc.feed, doc.array.columns, figure),
    ...(doc.feed.network === undefined ? {} : { feedNetwork: networkOf(doc.feed.network, libraries.transitions) }),
    ...(doc.array.groups === undefined ? {} : { groups: groupsOf(doc.array.groups) }),
    ...(doc.array.scan === undefined ? {} : { scan: scanOf(doc.array.scan) }),
    referenceImpedance: doc.reference_impedance === 'line' ? 'line' : si(doc.reference_impedance, 'resistance'),
    band: { low: si(doc.band.low, 'frequency'), high: si(doc.band.high, 'frequency') },
    temperature: {
      lowC: si(doc.temperature.low, 'temperature'),
      nominalC: si(doc.temperature.nominal, 'temperature'),
      highC: si(doc.temperature.high, 'temperature'),
    },
    tolerances: doc.tolerances?.etch ? { etch: figure(doc.tolerances.etch, 'length', ['tolerances', 'etch']) } : {},
    ...(doc.cost ? { cost: doc.cost } : {}),
    declared: declaredOf(doc.declared),
  };
}

function stackUpOf(
  doc: BoardDocument['stack_up'],
  libraries: Libraries,
  figure: MakeFigure,
  where: (path: Path) => string,
): StackUp {
  const thickness = (layer: { readonly thickness: FigureDocument }, key: string) =>
    figure(layer.thickness, 'length', ['stack_up', key, 'thickness']);
  const stripFoil = found(libraries.foils, doc.strip.foil);
  const groundFoil = found(libraries.foils, doc.ground.foil);
  const face = (foil: Foil, kind: 'treated' | 'untreated') =>
    kind === 'treated' ? foil.treatedFace : foil.untreatedFace;
  const outer = doc.strip.outer_face;
  // The foil's outer face is the one that does not lie towards the laminate.
  const outerTexture: Texture =
    outer.texture === undefined
      ? face(stripFoil, doc.strip.dielectric_face === 'treated' ? 'untreated' : 'treated')
      : textureOf(outer.texture, where(['stack_up', 'strip', 'outer_face', 'texture']), libraries.measurements);
  return {
    ...(doc.cover
      ? {
          cover: {
            material: doc.cover.material,
            permittivity: figure(doc.cover.permittivity, 'number', ['stack_up', 'cover', 'permittivity']),
            lossTangent: figure(doc.cover.loss_tangent, 'number', ['stack_up', 'cover', 'loss_tangent']),
            thickness: thickness(doc.cover, 'cover'),
          },
        }
      : {}),
    strip: {
      foil: stripFoil,
      thickness: thickness(doc.strip, 'strip'),
      finish: found(libraries.finishes, doc.strip.finish),
      outerFace: { kind: outer.kind === 'micro_etched' ? 'micro-etched' : outer.kind, texture: outerTexture },
      dielectricFace: { kind: doc.strip.dielectric_face, texture: face(stripFoil, doc.strip.dielectric_face) },
    },
    laminate: {
      material: found(libraries.laminates, doc.laminate.material),
      thickness: thickness(doc.laminate, 'laminate'),
    },
    ground: {
      foil: groundFoil,
      thickness: thickness(doc.ground, 'ground'),
      dielectricFace: { kind: doc.ground.dielectric_face, texture: face(groundFoil, doc.ground.dielectric_face) },
    },
    below: (doc.below ?? []).map(({ name, thickness: t }) => ({ name, thickness: si(t, 'length') })),
  };
}
