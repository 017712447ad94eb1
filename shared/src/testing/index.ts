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
export { aSealedLog } from './sealed-log';
export type { SealedLog, SealedLogParts } from './sealed-log';
export { aWireTurn } from './wire-turn';
export { aFeed, tablesOf } from './feed';
export type { FeedParts, FeedTexts, FeedTrain } from './feed';
