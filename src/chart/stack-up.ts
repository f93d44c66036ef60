import type { StackUpDrawing } from '../dossier/document.js';
import { spread } from './labels.js';
import { niceStep } from './scale.js';
import type { Drawing, Hatch, RectShape, Shape, Stroke } from './shapes.js';
import type { Theme } from './theme.js';
import { wrapText } from './wrap.js';

type Layer = StackUpDrawing['layers'][number];

const width = 480;
const left = 96;
const right = 266;
const labelX = 296;
const top = 26;
/** Height that the computed layers share, points. */
const drawnHeight = 150;
/** A layer below the ground that would be higher than this is broken. */
const tallest = 44;
const brokenHeight = 34;

/** Section through the board, to scale in thickness; layers below the ground are cut short where they are thick. */
export function stackUpShapes(data: StackUpDrawing, theme: Theme, title: string, desc: string): Drawing {
  const ink = theme.figure.ink;
  const thin: Stroke = { color: ink, width: 0.5 };
  const computed = data.layers.filter((layer) => layer.material !== 'below');
  const total = computed.reduce((sum, layer) => sum + layer.thicknessUm, 0);
  const scale = drawnHeight / Math.max(total, 1);
  const shapes: Shape[] = [];

  let y = top;
  const hasCover = data.layers.some((layer) => layer.material === 'cover');
  const placed = data.layers.map((layer) => {
    const broken = layer.material === 'below' && layer.thicknessUm * scale > tallest;
    const height = broken ? brokenHeight : layer.thicknessUm * scale;
    const place = { layer, broken, y, height, middle: y + height / 2 };
    y += height;
    return place;
  });
  const bottom = y;

  for (const place of placed) {
    shapes.push(...layerShapes(place.layer, place.y, place.height, hasCover, theme));
    if (place.broken) shapes.push(...breakMark(place.middle, theme));
  }

  // Names to the right, at least as far apart as their lines are high.
  const blocks = placed.map((place) => {
    const detail = place.broken ? `${place.layer.detail} (drawn broken, not to scale)` : place.layer.detail;
    return [
      ...wrapText(place.layer.label, 8.5, width - labelX, true).map((text) => ({ text, size: 8.5, bold: true })),
      ...wrapText(detail, 7.5, width - labelX).map((text) => ({ text, size: 7.5, bold: false })),
    ];
  });
  const gap = Math.max(...blocks.map((block) => block.length)) * 10 + 6;
  const room = Math.max(bottom + 24, top + gap * (blocks.length - 0.5));
  const heights = spread(
    placed.map((place) => place.middle),
    gap,
    top + gap / 2 - 12,
    room - gap / 2 + 8,
  );
  placed.forEach((place, i) => {
    const block = blocks[i];
    const first = heights[i] - (block.length * 10) / 2;
    shapes.push({
      shape: 'polyline',
      points: [
        [right, place.middle],
        [right + 8, place.middle],
        [labelX - 12, heights[i]],
        [labelX - 4, heights[i]],
      ],
      stroke: { color: theme.figure.muted, width: 0.5 },
    });
    block.forEach((line, n) => {
      shapes.push({
        shape: 'text',
        x: labelX,
        y: first + n * 10 + 7.5,
        text: line.text,
        size: line.size,
        anchor: 'start',
        color: line.bold ? ink : theme.figure.muted,
        bold: line.bold,
      });
    });
  });

  // Thicknesses to the left.
  const thicknessY = spread(
    placed.map((place) => place.middle),
    11,
    top - 4,
    room,
  );
  placed.forEach((place, i) => {
    shapes.push(
      {
        shape: 'polyline',
        points: [
          [left, place.middle],
          [left - 6, place.middle],
          [left - 14, thicknessY[i]],
          [left - 18, thicknessY[i]],
        ],
        stroke: { color: theme.figure.muted, width: 0.5 },
      },
      {
        shape: 'text',
        x: left - 21,
        y: thicknessY[i] + 2.8,
        text: `${place.layer.thicknessUm} µm`,
        size: 8,
        anchor: 'end',
        color: ink,
      },
    );
  });

  // Scale bar and the axis normal to the board.
  const bar = niceStep(total, 3);
  const barTop = top + drawnHeight - bar * scale;
  const barEnd = (at: number): Shape => ({
    shape: 'line',
    from: [16, at],
    to: [24, at],
    stroke: { color: ink, width: 1 },
  });
  shapes.push(
    { shape: 'line', from: [20, barTop], to: [20, top + drawnHeight], stroke: { color: ink, width: 1 } },
    barEnd(barTop),
    barEnd(top + drawnHeight),
    {
      shape: 'text',
      x: 12,
      y: (barTop + top + drawnHeight) / 2,
      text: `${bar} µm`,
      size: 8,
      anchor: 'middle',
      color: ink,
      rotate: -90,
    },
    { shape: 'arrow', from: [20, top + 26], to: [20, top - 6], head: 6, stroke: { color: ink, width: 0.9 } },
    { shape: 'text', x: 26, y: top - 1, text: 'z', size: 8.5, anchor: 'start', color: ink },
  );
  const height = Math.max(bottom, room) + 18;
  shapes.push({
    shape: 'text',
    x: left,
    y: height - 5,
    text: 'To scale in thickness; widths are not to scale.',
    size: 7.5,
    anchor: 'start',
    color: theme.figure.muted,
  });
  return {
    width,
    height,
    title,
    desc,
    shapes: [
      { shape: 'rect', x: 0, y: 0, width, height, fill: theme.figure.paper },
      ...shapes,
      outline(top, bottom, thin),
    ],
  };
}

function outline(from: number, to: number, stroke: Stroke): RectShape {
  return { shape: 'rect', x: left, y: from, width: right - left, height: to - from, stroke: { ...stroke, width: 0.4 } };
}

function layerShapes(layer: Layer, y: number, height: number, hasCover: boolean, theme: Theme): Shape[] {
  const ink = theme.figure.ink;
  const hatch = (spacing: number, angle: 45 | -45, color: string): Hatch => ({ spacing, angle, color, width: 0.4 });
  const rect = (x: number, w: number, fill: string, lines?: Hatch): RectShape => ({
    shape: 'rect',
    x,
    y,
    width: w,
    height,
    fill,
    stroke: { color: ink, width: 0.5 },
    ...(lines === undefined ? {} : { hatch: lines }),
  });
  const full = right - left;
  switch (layer.material) {
    case 'cover':
      return [rect(left, full, theme.figure.cover, hatch(9, -45, theme.figure.muted))];
    case 'dielectric':
      return [rect(left, full, theme.figure.dielectric)];
    case 'copper-ground':
      return [rect(left, full, theme.figure.copper, hatch(3.2, 45, ink))];
    case 'below':
      return [rect(left, full, theme.figure.below, hatch(7, -45, theme.figure.muted))];
    case 'copper-strip':
      // Etched: a patch and a line, with what lies between them.
      return [
        ...(hasCover ? [rect(left, full, theme.figure.cover)] : []),
        rect(left + full * 0.1, full * 0.5, theme.figure.copper, hatch(3.2, 45, ink)),
        rect(left + full * 0.74, full * 0.14, theme.figure.copper, hatch(3.2, 45, ink)),
      ];
  }
}

/** Two wavy lines with paper between them. */
function breakMark(y: number, theme: Theme): Shape[] {
  const wave = (dy: number): [number, number][] =>
    Array.from({ length: 35 }, (_, i) => [
      left - 4 + (i * (right - left + 8)) / 34,
      y + dy + 2 * Math.sin((i * Math.PI) / 3),
    ]);
  const upper = wave(-2.5);
  const lower = wave(2.5);
  const stroke: Stroke = { color: theme.figure.ink, width: 0.6 };
  return [
    { shape: 'polyline', points: [...upper, ...lower.slice().reverse()], closed: true, fill: theme.figure.paper },
    { shape: 'polyline', points: upper, stroke },
    { shape: 'polyline', points: lower, stroke },
  ];
}
