import type { ToothDrawing } from '../dossier/document.js';
import { niceStep, printNumber } from './scale.js';
import type { Drawing, Shape, Stroke } from './shapes.js';
import type { Theme } from './theme.js';
import { wrapText } from './wrap.js';

type Face = ToothDrawing['faces'][number];

const width = 560;
const left = 152;
const right = 548;
/** Room above and below the profile within its panel, points. */
const head = 16;
const body = 14;
/** Places of the bars for skin depth, Rq and Rz. */
const bars = { depth: left - 62, rq: left - 40, rz: left - 18 } as const;
const size = 8;

/** Sections through the copper faces, one panel each, one true scale in both directions; copper below. */
export function toothShapes(data: ToothDrawing, theme: Theme, title: string, desc: string): Drawing {
  const scale = (right - left) / data.widthUm;
  const shapes: Shape[] = [];
  let y = 8;
  for (const face of data.faces) {
    const panel = panelShapes(face, y, scale, theme);
    shapes.push(...panel.shapes);
    y = panel.bottom + 14;
  }
  shapes.push(...scaleBar(data, y, scale, theme));
  const height = y + 22;
  return {
    width,
    height,
    title,
    desc,
    shapes: [{ shape: 'rect', x: 0, y: 0, width, height, fill: theme.figure.paper }, ...shapes],
  };
}

/** Highest and lowest of what is drawn, µm above the mean plane, with room for the bars. */
function extent({ profile, nodules, rqUm, skinDepthUm, rz }: Face): readonly [number, number] {
  const balls = (nodules?.centres ?? []).flatMap(([, z]) => [z + nodules!.radiusUm, z - nodules!.radiusUm]);
  const drawn = [...profile.heightsUm, ...balls, rqUm, -skinDepthUm, rz.um / 2, -rz.um / 2];
  return [drawn.reduce((a, b) => Math.min(a, b)), drawn.reduce((a, b) => Math.max(a, b))];
}

function panelShapes(face: Face, top: number, scale: number, theme: Theme): { shapes: Shape[]; bottom: number } {
  const { ink, muted, copper, dielectric, paper } = theme.figure;
  const text = (x: number, y: number, words: string, look: { bold?: boolean; color?: string } = {}): Shape => ({
    shape: 'text',
    x,
    y,
    text: words,
    size,
    anchor: 'start',
    color: look.color ?? ink,
    ...(look.bold === undefined ? {} : { bold: look.bold }),
  });
  const titles = wrapText(face.label, size + 0.5, right - 8, true);
  const upper = top + titles.length * 11 + 2;
  const [lowest, highest] = extent(face);
  const mean = upper + head + highest * scale;
  const lower = mean - lowest * scale + body;
  const at = (x: number, z: number): readonly [number, number] => [left + x * scale, mean - z * scale];

  const shapes: Shape[] = titles.map((line, i) => ({
    ...(text(8, top + 8 + i * 11, line, { bold: true }) as Extract<Shape, { shape: 'text' }>),
    size: size + 0.5,
  }));
  // What lies above the copper fills the panel; copper, balls and bars are painted onto it.
  shapes.push({
    shape: 'rect',
    x: left,
    y: upper,
    width: right - left,
    height: lower - upper,
    fill: face.above === 'laminate' ? dielectric : paper,
  });
  const { intervalUm, heightsUm } = face.profile;
  const surface = heightsUm.map((z, i) => at(i * intervalUm, z));
  const end = surface[surface.length - 1][0];
  const line: Stroke = { color: ink, width: 0.7 };
  shapes.push(
    {
      shape: 'polyline',
      points: [[left, lower], ...surface, [end, lower]],
      closed: true,
      fill: copper,
    },
    ...(face.nodules?.centres ?? []).map(([x, z]) => ball(at(x, z), face.nodules!.radiusUm * scale, copper, line)),
    { shape: 'polyline', points: surface, stroke: line },
    {
      shape: 'line',
      from: [left, mean],
      to: [right, mean],
      stroke: { color: muted, width: 0.6, dash: [4, 3] },
    },
    {
      shape: 'rect',
      x: left,
      y: upper,
      width: right - left,
      height: lower - upper,
      stroke: { color: muted, width: 0.5 },
    },
    text(left + 5, upper + 10, face.above === 'laminate' ? 'laminate' : 'outside'),
    text(left + 5, lower - 4, 'copper'),
  );

  // Bars at the same scale, counted from the mean plane: the skin depth into the copper, Rq upwards, Rz across.
  const bar = (x: number, from: number, to: number, name: string, strong: boolean): Shape[] => [
    ...(strong
      ? [
          {
            shape: 'rect' as const,
            x: x - 5,
            y: mean - to * scale,
            width: 10,
            height: (to - from) * scale,
            fill: theme.figure.accent,
          },
        ]
      : bracket(x, mean - from * scale, mean - to * scale, line)),
    {
      shape: 'text',
      x,
      y: Math.min(mean - to * scale, mean) - 5,
      text: name,
      size: 7.5,
      anchor: 'middle',
      color: ink,
    },
  ];
  shapes.push(
    ...bar(bars.depth, -face.skinDepthUm, 0, 'δ', true),
    ...bar(bars.rq, 0, face.rqUm, 'Rq', false),
    ...bar(bars.rz, -face.rz.um / 2, face.rz.um / 2, 'Rz', false),
  );
  const um = (value: number) => printNumber(value, value < 1 ? 3 : 2);
  const values = [
    'Skin depth',
    `δ ${um(face.skinDepthUm)} µm`,
    `Rq ${um(face.rqUm)} µm`,
    `Rz ${um(face.rz.um)} µm`,
    ...(face.rz.assumed ? ['(5.5 Rq assumed)'] : []),
  ];
  const first = upper + 8;
  values.forEach((words, i) => {
    shapes.push({ ...(text(8, first + i * 10, words) as Extract<Shape, { shape: 'text' }>), size: 7.5 });
  });
  const notes = wrapText(face.note, 7.5, right - left);
  const noteTop = Math.max(lower, first + (values.length - 2) * 10) + 10;
  notes.forEach((words, i) => {
    shapes.push({
      ...(text(left, noteTop + i * 9.5, words, { color: muted }) as Extract<Shape, { shape: 'text' }>),
      size: 7.5,
    });
  });
  return { shapes, bottom: Math.max(noteTop + (notes.length - 1) * 9.5, first + (values.length - 1) * 10) + 2 };
}

const SIDES = 32;

function ball([cx, cy]: readonly [number, number], radius: number, fill: string, stroke: Stroke): Shape {
  return {
    shape: 'polyline',
    closed: true,
    points: Array.from({ length: SIDES }, (_, i) => {
      const angle = (2 * Math.PI * i) / SIDES;
      return [cx + radius * Math.cos(angle), cy + radius * Math.sin(angle)] as const;
    }),
    fill,
    stroke,
  };
}

/** A line with a stroke across each end. */
function bracket(x: number, from: number, to: number, stroke: Stroke): Shape[] {
  const across = (y: number): Shape => ({ shape: 'line', from: [x - 4, y], to: [x + 4, y], stroke });
  return [{ shape: 'line', from: [x, from], to: [x, to], stroke }, across(from), across(to)];
}

function scaleBar({ widthUm }: ToothDrawing, y: number, scale: number, theme: Theme): Shape[] {
  const { ink, muted } = theme.figure;
  const bar = niceStep(widthUm, 8);
  const stroke: Stroke = { color: ink, width: 1 };
  const tick = (x: number): Shape => ({ shape: 'line', from: [x, y], to: [x, y + 8], stroke });
  const end = left + bar * scale;
  return [
    { shape: 'line', from: [left, y + 4], to: [end, y + 4], stroke },
    tick(left),
    tick(end),
    { shape: 'text', x: end + 6, y: y + 7, text: `${bar} µm`, size, anchor: 'start', color: ink },
    {
      shape: 'text',
      x: right,
      y: y + 7,
      text: 'One scale in both directions and for all faces.',
      size: 7.5,
      anchor: 'end',
      color: muted,
    },
  ];
}
