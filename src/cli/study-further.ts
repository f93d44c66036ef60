/** More of the full wave where a verdict hangs on it. */
import type { Analysis, RequirementSet } from '../manifest/model.js';
import type { BoardStudy } from '../study/index.js';
import { furtherFrequencies, judgePack } from '../verdict/index.js';
import { confirmBoards, type Further, type Room, studyBoards } from './study-pack.js';

/**
 * Boards with a figure nearer to its limit than its uncertainty get the full wave at the frequencies where that is so, and
 * are studied once more with what it says.
 *
 * @returns studies in the given order, the others as they are
 */
export async function studyFurther(
  studies: readonly BoardStudy[],
  requirements: RequirementSet,
  analysis: Analysis,
  room: Room,
): Promise<readonly BoardStudy[]> {
  const verdicts = judgePack(studies, requirements);
  const asked = studies.flatMap((study, i) => {
    const frequencies = furtherFrequencies(study, verdicts[i]);
    return frequencies.length === 0 ? [] : [{ study, frequencies }];
  });
  if (asked.length === 0) return studies;
  const boards = asked.map(({ study }) => study.board);
  const further = asked.map(({ study, frequencies }): Further => ({ frequencies, earlier: study.confirmation }));
  const confirmations = await confirmBoards(boards, analysis, room, further);
  const again = await studyBoards(boards, analysis, confirmations, 'calculating boards near a limit', room);
  return studies.map((study) => again[asked.findIndex((entry) => entry.study === study)] ?? study);
}
