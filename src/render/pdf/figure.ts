import type { FigureBlock } from '../../dossier/document.js';
import type { Box } from './flow.js';
import { bodyWidth, page, type } from './layout.js';
import { LineSetter } from './lines.js';
import { paintLine } from './paint-line.js';
import type { Picture } from './picture.js';
import type { Element, Press } from './press.js';
import { bold, muted, textRuns } from './runs.js';
import { safeText } from './safe-text.js';

const largestScale = 1;
/** Its text must stay readable: about 6.8 points in charts. */
const smallestShrink = 0.82;

/**
 * Title, picture and reading, kept on one page. The picture shrinks to the width of the body, and further where the
 * texts leave it less of the page, down to a third of the page.
 */
export function figureBoxes(
  press: Press,
  figure: FigureBlock,
  picture: Picture,
  bodyHeight: number,
  parent: Element,
): Box[] {
  const group = press.element('Div', parent);
  const caption = press.element('Caption', group);
  // Made when the picture is painted, since its bounds are known only then and its reading comes after it.
  let reading: Element;
  const titleLines = new LineSetter(press, type.label.size).lines(textRuns(figure.title, bold), bodyWidth);
  const readingLines = new LineSetter(press, type.body.size).lines(textRuns(figure.reading, muted), bodyWidth);

  const texts = titleLines.length * type.label.leading + readingLines.length * type.body.leading + 12;
  const room = Math.max(bodyHeight / 3, bodyHeight - texts);
  const scale = Math.min(largestScale, bodyWidth / picture.width, room / picture.height);

  const titles = titleLines.map(
    (line, i): Box => ({
      before: i === 0 ? 12 : 0,
      height: type.label.leading,
      keep: true,
      paint: (top) => {
        if (i === 0) press.markPlace(figure.id, top);
        paintLine(press, line, type.label, page.left, top, caption, 'Caption');
      },
    }),
  );
  const body: Box = {
    before: 3,
    height: picture.height * scale,
    least: picture.height * scale * smallestShrink,
    keep: true,
    paint: (top, height) => {
      const shown = height / picture.height;
      const width = picture.width * shown;
      const x = page.left + (bodyWidth - width) / 2;
      const bbox: [number, number, number, number] = [x, top, x + width, top + height];
      const element = press.element('Figure', group, { alt: safeText(figure.alt), bbox, placement: 'Block' });
      press.tagged(element, 'Figure', () => picture.paint(press, x, top, shown));
      reading = press.element('P', group);
    },
  };
  const readings = readingLines.map(
    (line, i): Box => ({
      before: i === 0 ? 3 : 0,
      height: type.body.leading,
      keep: i < readingLines.length - 1,
      paint: (top) => paintLine(press, line, type.body, page.left, top, reading, 'P'),
    }),
  );
  return [...titles, body, ...readings];
}
