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
