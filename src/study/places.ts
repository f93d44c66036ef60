/** Every figure of a board that has a place in `BoardValues`. */
import type { Board, Figure, Texture } from '../manifest/model.js';
import type { Dimension } from '../quantity/index.js';
import type { BoardValues, FaceTexture } from './values.js';

export interface Place {
  readonly figure: Figure;
  readonly label: string;
  readonly dimension: Dimension | 'number';
  readonly set: (values: BoardValues, value: number) => BoardValues;
}

export function places(board: Board): Place[] {
  const { strip, ground, laminate } = board.stackUp;
  const { material } = laminate;
  const inner = 'face to the laminate';
  return [
    { figure: material.permittivity, label: 'laminate permittivity', dimension: 'number', set: at('permittivity') },
    { figure: material.lossTangent, label: 'laminate loss tangent', dimension: 'number', set: at('lossTangent') },
    { figure: laminate.thickness, label: 'laminate thickness', dimension: 'length', set: at('height') },
    { figure: strip.thickness, label: 'strip thickness', dimension: 'length', set: at('stripThickness') },
    conductivity(strip.foil.conductivity, 'stripConductivity'),
    conductivity(ground.foil.conductivity, 'groundConductivity'),
    ...texturePlaces(strip.dielectricFace.texture, 'underside', inner),
    ...texturePlaces(ground.dielectricFace.texture, 'ground', inner),
    ...texturePlaces(strip.outerFace.texture, 'outer', 'outer face'),
    ...coefficientPlaces(board),
    ...finishPlaces(board),
    ...coverPlaces(board),
    ...board.feed.flatMap((path, i): Place[] =>
      path.lossDb
        ? [{ figure: path.lossDb, label: 'feed path loss', dimension: 'level', set: item('feedLossDb', i) }]
        : [],
    ),
    ...(board.tolerances.etch
      ? [
          {
            figure: board.tolerances.etch,
            label: 'etched outline',
            dimension: 'length',
            set: at('etch'),
          } satisfies Place,
        ]
      : []),
  ];
}

const at =
  <K extends keyof BoardValues>(key: K) =>
  (values: BoardValues, value: number): BoardValues => ({ ...values, [key]: value });

const item =
  (key: 'finishConductivity' | 'finishThickness' | 'feedLossDb', index: number) =>
  (values: BoardValues, value: number): BoardValues => ({
    ...values,
    [key]: values[key].map((v, i) => (i === index ? value : v)),
  });

const conductivity = (figure: Figure, key: 'stripConductivity' | 'groundConductivity'): Place => ({
  figure,
  label: 'copper conductivity',
  dimension: 'conductivity',
  set: at(key),
});

type Face = 'underside' | 'outer' | 'ground';

/** A stated Rz has none: it enters the curve of one model and no sweep. */
function texturePlaces(texture: Texture, face: Face, of: string): Place[] {
  const known =
    (key: 'rq' | 'correlationLength' | 'developedAreaRatio') =>
    (values: BoardValues, value: number): BoardValues => ({ ...values, [face]: { ...values[face], [key]: value } });
  const nodules =
    (key: 'radius' | 'pitch') =>
    (values: BoardValues, value: number): BoardValues => {
      const { nodule } = values[face];
      const moved: FaceTexture = nodule ? { ...values[face], nodule: { ...nodule, [key]: value } } : values[face];
      return { ...values, [face]: moved };
    };
  const list: Place[] = [{ figure: texture.rq, label: `texture of the ${of}`, dimension: 'length', set: known('rq') }];
  const { correlationLength, developedAreaRatio, nodule } = texture;
  if (correlationLength)
    list.push({
      figure: correlationLength,
      label: `correlation length of the ${of}`,
      dimension: 'length',
      set: known('correlationLength'),
    });
  if (developedAreaRatio)
    list.push({
      figure: developedAreaRatio,
      label: `developed area ratio of the ${of}`,
      dimension: 'number',
      set: known('developedAreaRatio'),
    });
  if (nodule)
    list.push(
      { figure: nodule.radius, label: `nodule radius of the ${of}`, dimension: 'length', set: nodules('radius') },
      { figure: nodule.pitch, label: `nodule pitch of the ${of}`, dimension: 'length', set: nodules('pitch') },
    );
  return list;
}

function coefficientPlaces(board: Board): Place[] {
  const { permittivityTemperatureCoefficient: tce, lossTangentTemperatureCoefficient: tcd } =
    board.stackUp.laminate.material;
  const list: Place[] = [];
  if (tce)
    list.push({
      figure: tce,
      label: 'temperature coefficient of permittivity',
      dimension: 'temperature_coefficient',
      set: at('permittivityTemperatureCoefficient'),
    });
  if (tcd)
    list.push({
      figure: tcd,
      label: 'temperature coefficient of loss tangent',
      dimension: 'temperature_coefficient',
      set: at('lossTangentTemperatureCoefficient'),
    });
  return list;
}

const finishPlaces = (board: Board): Place[] =>
  board.stackUp.strip.finish.layers.flatMap((layer, i): Place[] => [
    {
      figure: layer.conductivity,
      label: `${layer.material} conductivity`,
      dimension: 'conductivity',
      set: item('finishConductivity', i),
    },
    {
      figure: layer.thickness,
      label: `${layer.material} thickness`,
      dimension: 'length',
      set: item('finishThickness', i),
    },
  ]);

function coverPlaces(board: Board): Place[] {
  const { cover } = board.stackUp;
  if (!cover) return [];
  const part =
    (key: 'permittivity' | 'lossTangent' | 'thickness') =>
    (values: BoardValues, value: number): BoardValues =>
      values.cover ? { ...values, cover: { ...values.cover, [key]: value } } : values;
  return [
    { figure: cover.permittivity, label: 'cover permittivity', dimension: 'number', set: part('permittivity') },
    { figure: cover.lossTangent, label: 'cover loss tangent', dimension: 'number', set: part('lossTangent') },
    { figure: cover.thickness, label: 'cover thickness', dimension: 'length', set: part('thickness') },
  ];
}
