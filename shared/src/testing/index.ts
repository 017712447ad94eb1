export {
  aPlan,
  aStep,
  aStepDone,
  aTurn,
  anEntry,
  fixedArrival,
  fixedDeparture,
  fixedServiceDate,
  fixedZone,
} from './builders';
export { seededRandom } from './seeded-random';
export { aWireTurn } from './wire-turn';
export { aFeed, tablesOf } from './feed';
export type { FeedParts, FeedTexts, FeedTrain } from './feed';
