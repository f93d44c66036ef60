import type { Board } from '../manifest/model.js';
import type { Cut, EngineComparison } from '../study/results.js';
import { figureBlock } from './blocks.js';
import { curve, FLOOR_DB } from './chapter-patterns.js';
import type { Block } from './document.js';
import { gigahertz, valueText } from './values.js';

const DEGREES = 180 / Math.PI;

/** The compared frequency in the middle of the band. */
export const centreOf = ({ band }: Board, points: readonly EngineComparison[]): EngineComparison => {
  const middle = (band.low + band.high) / 2;
  return points.reduce((a, b) => (Math.abs(b.frequency - middle) < Math.abs(a.frequency - middle) ? b : a));
};

function cutOfBoth(point: EngineComparison, plane: Cut['plane'], positive: string): Block {
  const { fullWave, network, frequency } = point;
  const name = plane === 'elevation' ? 'Elevation' : 'Azimuth';
  const direction = (figures: typeof fullWave) => valueText(figures[plane].beamDirection * DEGREES, 'deg');
  return figureBlock({
    id: `engine-cut-${plane}`,
    title: `${name} cut by both engines at ${gigahertz(frequency)}`,
    reading: `The beam points to ${direction(fullWave)} by the full wave and to ${direction(network)} by the network.`,
    alt: `Level over angle from −90° to 90°, relative to the maximum of each curve, one curve by the full wave and one by the network.`,
    content: {
      chart: 'cut',
      xTitle: `Angle from broadside (°), positive ${positive}`,
      yTitle: 'Level relative to the maximum (dB)',
      xDomain: [-90, 90],
      yDomain: [FLOOR_DB, 0],
      series: [
        { label: 'Full wave', points: curve(fullWave.cuts[plane]) },
        { label: 'Network', points: curve(network.cuts[plane]) },
      ],
      masks: [],
    },
  });
}

/** Both cuts at the band centre: an array of one column has its own azimuth cut too. */
export function engineCuts(board: Board, points: readonly EngineComparison[]): readonly Block[] {
  const centre = centreOf(board, points);
  return [cutOfBoth(centre, 'elevation', 'towards +x'), cutOfBoth(centre, 'azimuth', 'towards +y')];
}
