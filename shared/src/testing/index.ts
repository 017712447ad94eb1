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

export { aFeed, tablesOf } from './feed';
export type { FeedParts, FeedTexts, FeedTrain } from './feed';
