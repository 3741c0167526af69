import { type CombinationSet, combinationSet } from './combination-set';
import asce16Asd from './sets/asce-7-16-asd.json';
import asce16Lrfd from './sets/asce-7-16-lrfd.json';
import asce22Asd from './sets/asce-7-22-asd.json';
import asce22Lrfd from './sets/asce-7-22-lrfd.json';
import en1990 from './sets/en-1990-6.10.json';
import en1990ab from './sets/en-1990-6.10ab.json';
import en1990uk from './sets/en-1990-6.10ab-uk.json';

/** The sets that come with the engine, by edition. Which of them governs, the local code decides. */
export const publishedSets: readonly CombinationSet[] = [
  asce22Lrfd,
  asce22Asd,
  asce16Lrfd,
  asce16Asd,
  en1990,
  en1990ab,
  en1990uk,
].map((set) => combinationSet.parse(set));

export function findSet(key: string): CombinationSet | undefined {
  return publishedSets.find((set) => set.key === key);
}
