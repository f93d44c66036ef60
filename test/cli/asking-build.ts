import { buildPack } from '../../src/cli/build.js';
import { noProgress } from '../../src/cli/progress.js';
import { carryOut } from '../../src/cli/study-job.js';
import { inThisThread } from '../../src/cli/workers.js';
import { filesOf, smallPack, type Wish } from './small-pack.js';

/**
 * Builds the small pack with a procurement file and the answers of its laminate maker, in memory.
 *
 * @param stages  gets the names of the stages of the build
 */
export async function askingBuild(wish: Wish, procurement: string, answers: string, stages: string[] = []) {
  const files = smallPack(wish);
  files['pack.yaml'] = files['pack.yaml'].replace('requirements:', 'procurement: procurement.yaml\nrequirements:');
  files['procurement.yaml'] = procurement.replace(
    'materials: [nl-30]',
    'materials: [nl-30]\n    answers: laminate.csv',
  );
  files['laminate.csv'] = answers;
  let revision = new Map<string, string>();
  const outcome = await buildPack(
    { packPath: 'pack.yaml', programVersion: '9.9.9' },
    {
      files: filesOf(files),
      openOutput: () => ({
        publishRevision(_, made) {
          revision = new Map([...made].map(([path, content]) => [path, Buffer.from(content).toString('utf8')]));
          return 'written';
        },
        readFile: () => undefined,
        close: () => undefined,
      }),
      progress: { ...noProgress, stage: (name) => void stages.push(name) },
      workers: inThisThread(carryOut),
    },
  );
  return { outcome, revision };
}
