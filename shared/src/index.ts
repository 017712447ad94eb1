// lib
export { assertNever } from './lib/assert-never';
export {
  addSeconds,
  formatInstant,
  millisecondsInHour,
  millisecondsInMinute,
  millisecondsInSecond,
  parseInstant,
  secondsBetween,
} from './lib/instant';
export type { CalendarDate, Instant } from './lib/instant';
export { ok, refused } from './lib/result';
export type { Result } from './lib/result';
export { formatClock, formatDuration, formatServiceDate, formatZoneLetters } from './lib/zone-time';
export type { ClockFormat } from './lib/zone-time';

// timetable
export { compareTimetables } from './timetable/compare-timetables';
export type {
  ComparedTurn,
  Comparison,
  DateDifference,
  TurnDifference,
} from './timetable/compare-timetables';
export { deriveTurns } from './timetable/derive-turns';
export type { DerivedTurn } from './timetable/derive-turns';
export { FEED_FILES, isFeedFile } from './timetable/feed-files';
export type { FeedFile } from './timetable/feed-files';
export { openingsFor } from './timetable/openings';
export type { OpeningsQuestion, PlannedOpening, TerminalChoice } from './timetable/openings';
export { PROBLEM_SEVERITIES } from './timetable/problem';
export type { ImportProblem, ProblemSeverity } from './timetable/problem';
export { createTimetableReading, readTimetable } from './timetable/reading';
export type { FeedRow, FeedTables, TimetableReading } from './timetable/reading';
export type { ReadOutcome } from './timetable/build-timetable';
export { formatRouteTypes, parseRouteTypes, railRouteTypes } from './timetable/route-types';
export type { RouteTypes } from './timetable/route-types';
export { activationOn, spanOfActivation } from './timetable/running';
export type { Activation } from './timetable/running';
export {
  addDays,
  calendarDateAt,
  datesBetween,
  daysBetween,
  formatServiceTime,
  isCalendarDate,
  isZone,
  parseServiceTime,
  secondsOfServiceDay,
  serviceDayStart,
  serviceInstant,
  weekdayOf,
} from './timetable/service-day';
export { runningDates } from './timetable/service-days';
export { summarise } from './timetable/summarise';
export type { StationGap, TimetableSummary } from './timetable/summarise';
export type { StationSummary } from './timetable/summarise-stations';
export { terminalTracks } from './timetable/terminal-tracks';
export type { TerminalTracks } from './timetable/terminal-tracks';
export type {
  Timetable,
  TimetableLink,
  TimetableService,
  TimetableStop,
  TimetableTrip,
} from './timetable/timetable';

// plan
export { PLAN_PROBLEMS, checkPlan } from './plan/check-plan';
export type { PlanProblem, PlanProblemCode } from './plan/check-plan';
export { defaultStepPlanKey, defaultStepPlanName, defaultStepPlanSteps } from './plan/default-step-plan';
export { arrivalEvent, departureEvent, orderSteps, stepsAfterDeparture } from './plan/step-network';
export { rolesOf } from './plan/step-roles';
export type { StepRoles } from './plan/step-roles';
export { shortestTurnSeconds, stepsFor } from './plan/steps-for-turn';
export type { StepsQuestion } from './plan/steps-for-turn';
export { ANCHORS, DOERS, PLACES, READINGS, STEP_KINDS, isInCab } from './plan/step-plan';
export type { Anchor, Doer, Place, PlanStep, ReadingKey, StepKind, StepPlan } from './plan/step-plan';

// turn
export { compareAccounts, inQuestionSeconds } from './turn/account';
export type { Account } from './turn/account';
export type { Answer } from './turn/answers';
export { wouldNeedApproval } from './turn/approvals';
export type { Decision, RecordChange } from './turn/approvals';
export { attendanceAt, handbrakesStanding, silenceSeconds } from './turn/attendance';
export type { Attendance } from './turn/attendance';
export { blueSignalAt } from './turn/blue-signals';
export type { BlueSignal } from './turn/blue-signals';
export { CORRECTION_STATES } from './turn/corrections';
export type { CorrectionState, RecordCorrection } from './turn/corrections';
export { crewToCarry } from './turn/carried-crew';
export type { CrewOnTurn, ReliefFact } from './turn/crew';
export {
  CREW_ROLES,
  DEFECT_CAUSES,
  ENTRY_KINDS,
  ENTRY_SOURCES,
  SUBJECT_KINDS,
  TIE_UP_CHECKS,
} from './turn/entry';
export type {
  CrewRole,
  DefectCause,
  Entry,
  EntryAuthor,
  EntryContent,
  EntryKind,
  EntrySource,
  LeftHandbrakes,
  Reading,
  SubjectKind,
  TieUpCheck,
} from './turn/entry';
export type { EntryFinding, EntryFindingCode } from './turn/entry-finding';
export { evolve, startOfTurn, turnFrom } from './turn/evolve';
export type { AsksAgreement, CannotDo, InQuestion, TurnFacts, TurnNote } from './turn/facts';
export { formatEntryFinding, sourceWords, stepRemarks } from './turn/finding-words';
export type { FormatTime } from './turn/finding-words';
export type { Handbrakes } from './turn/handbrakes';
export {
  closedAfterSeconds,
  firstOutHorizonSeconds,
  inboundHorizonSeconds,
  lifeOf,
  openStepState,
  stepStateOf,
} from './turn/life';
export type { OpenStep, StepTimes } from './turn/life';
export type { DefectReport, TieUp } from './turn/remarks';
export { compareEntries } from './turn/standing-entries';
export { HEALTHS, STEP_STATES, TURN_KINDS, TURN_STATES } from './turn/turn';
export type { Health, PlannedTurn, StepState, TurnKind, TurnState } from './turn/turn';
export { isUndo, undoGraceSeconds, undoSeconds } from './turn/undo';

// forecast
export { forecastTurn, outlookOf } from './forecast/forecast';
export type { Forecast, Outlook, StepForecast } from './forecast/forecast';
export { forecastInputOf } from './forecast/forecast-input';
export type { ForecastInput } from './forecast/forecast-input';
export { scheduleNetwork } from './forecast/network';
export type { Activity, ActivityTimes, NetworkRefusal, NetworkSchedule } from './forecast/network';

// records
export { canonicalJson } from './records/canonical-json';
export { HeadFinder, receiptDay } from './records/daily-heads';
export type { DailyHead, SealedPoint } from './records/daily-heads';
export { columnsOf } from './records/entry-columns';
export type { EntryColumns } from './records/entry-columns';
export { LogCheck, mostFaultsKept } from './records/log-check';
export type { LogCheckOptions } from './records/log-check';
export { formatLogLine, readLogLine } from './records/log-line';
export type { KeptEntry, LineRefusal, LogLine } from './records/log-line';
export type { ChangedPart, EntryPlace, LogFault, LogHead, LogNote, LogVerdict } from './records/log-verdict';
export { formatEntryFault, formatLogFault, formatLogNote } from './records/log-words';
export { hashEnvelope, noPreviousHash, sealEntry } from './records/seal';
export type { Envelope, Seal, SealableEntry } from './records/seal';

// lateness
export { nextAlertStep, noAlertMemory, shippedHoldTimes } from './lateness/alert-life';
export type { AlertHoldTimes, AlertMemory, AlertObservation, AlertStep } from './lateness/alert-life';
export { ALERT_EVENTS, alertAfter, raisedAlert } from './lateness/alert-state';
export type { AlertEvent, AlertRefusal, AlertStanding } from './lateness/alert-state';
export {
  countByPeriod,
  findBursts,
  loadPeriodSeconds,
  periodCount,
  publishedBurstRule,
  spansByPeriod,
} from './lateness/alert-load';
export type { Burst, BurstRule, InstantRange } from './lateness/alert-load';
export { assess } from './lateness/assess';
export { assessedTurnOf } from './lateness/assessed-turn';
export type { AssessedContext, AssessedStep, AssessedTurn } from './lateness/assessed-turn';
export { ALERT_CAUSES, ALERT_STATES, PRIORITIES } from './lateness/finding';
export type { AlertCause, AlertState, Finding, Priority } from './lateness/finding';
export { healthOf } from './lateness/health';
export { isAssessed, lateSlackSeconds, shortByDesignSeconds } from './lateness/horizon';
export { gapWords } from './lateness/securement';
export { shippedLatenessSettings } from './lateness/settings';
export type { LatenessSettings } from './lateness/settings';

// contract: quality of alerts
export {
  AFTERWARDS,
  alertQualityQuerySchema,
  alertQualitySchema,
  longestAlertQualityDays,
} from './contract/alert-quality';
export type { Afterwards, AlertQualityQuery, WireAlertQuality } from './contract/alert-quality';

// contract: alerts
export {
  ALERT_QUESTIONS,
  alertSchema,
  alertsQuerySchema,
  closeAlertSchema,
  longestSetAsideMinutes,
  setAsideSchema,
} from './contract/alerts';
export type { AlertsQuery, CloseAlertRequest, SetAsideRequest, WireAlert } from './contract/alerts';

// contract: history
export { departureRowSchema, historyImportSchema, onTimeQuerySchema, onTimeSchema } from './contract/history';
export type { DepartureRow, OnTimeAnswer, OnTimeQuery, WireHistoryImport } from './contract/history';

// contract: live
export { LIVE_EVENTS, liveQuerySchema } from './contract/live';
export { beatSeconds, notLiveAfterSeconds } from './contract/live-times';
export type { LiveEvent, LiveQuery } from './contract/live';

// contract: plans
export { createPlanSchema, longestInstruction, planStepSchema, stepPlanSchema } from './contract/plans';
export type { CreatePlanRequest, WireStepPlan } from './contract/plans';

// contract: primitives
export { dateSchema, idSchema, instantSchema, terminalCodeSchema, textSchema } from './contract/primitives';

// contract: sets
export { UNIT_KINDS, putSetSchema, setSchema, unitSchema } from './contract/sets';
export type { PutSetRequest, UnitKind, WireSet, WireUnit } from './contract/sets';

// contract: timetables
export {
  TIMETABLE_STATES,
  activationSchema,
  comparedDays,
  derivedTurnSchema,
  derivedTurnsQuerySchema,
  differenceQuerySchema,
  importProblemSchema,
  terminalChoiceSchema,
  timetableDifferenceSchema,
  timetableHeadSchema,
  timetableSchema,
  timetableSummarySchema,
  uploadFieldsSchema,
  uploadReceiptSchema,
} from './contract/timetables';
export type {
  ActivationRequest,
  DerivedTurnsQuery,
  DifferenceQuery,
  TimetableState,
  UploadFields,
  UploadReceipt,
  WireComparedTurn,
  WireDerivedTurn,
  WireImportProblem,
  WireStationSummary,
  WireTerminalChoice,
  WireTimetable,
  WireTimetableDifference,
  WireTimetableHead,
  WireTimetableSummary,
} from './contract/timetables';

// contract: lateness settings
export { holdTimesOf, latenessSettingsOf } from './contract/lateness-settings';

// contract: a turn worked out from the wire
export {
  assessedTurnOfWire,
  forecastInputOfWire,
  forecastOfWire,
  stepStatesOfWire,
  wireSecurementOf,
} from './contract/turn-from-wire';

// contract: entries
export { actTimeOf } from './contract/act-time';
export { readingSchema, recordEntrySchema, wireEntrySchema } from './contract/entries';
export type { RecordEntryRequest, WireEntry, WireReading } from './contract/entries';

// contract: corrections
export {
  CORRECTION_QUESTIONS,
  correctionsQuerySchema,
  listedCorrectionSchema,
} from './contract/record-corrections';
export type { CorrectionsQuery, ListedCorrection } from './contract/record-corrections';

// contract: what people still have to settle about a turn
export { turnCorrectionSchema } from './contract/turn-matters';
export type { WireCorrection, WireTurnMatters } from './contract/turn-matters';
export { turnMattersOf } from './contract/wire-turn-matters';

// contract: turns
export {
  boardAheadMinutes,
  boardBackMinutes,
  boardQuerySchema,
  boardSchema,
  createTurnSchema,
  entryReceiptSchema,
  findQuerySchema,
  foundTurnSchema,
  turnSchema,
} from './contract/turns';
export type {
  BoardQuery,
  CreateTurnRequest,
  EntryReceipt,
  FindQuery,
  FoundTurn,
  WireBoard,
  WireSecurement,
  WireStep,
  WireTurn,
} from './contract/turns';

// access
export { ALL_TERMINALS, ROLES, grantCovers, isRole, rolesAt } from './access/roles';
export type { PersonAccess, Role, RoleGrant } from './access/roles';
export {
  PERMISSIONS,
  isPermission,
  may,
  mayEverywhere,
  rolesWith,
  terminalsWhere,
} from './access/permissions';
export type { Permission } from './access/permissions';
export { barredAtTheControls, mayRecord, recordableKinds, withdrawalReach } from './access/recording';
export type { ControlsQuestion, WithdrawalReach } from './access/recording';

export { judgePassword } from './access/password';
export type { PasswordVerdict } from './access/password';
export { judgePin, pinLongest, pinPattern, pinShortest } from './access/pin';
export type { PinVerdict } from './access/pin';
export { passwordAdvised, passwordLongest, passwordShortest } from './access/password-lengths';

// contract: errors
export { errorBodySchema } from './contract/error-body';
export type { ErrorBody } from './contract/error-body';
export { ERROR_STATUSES, isErrorCode } from './contract/errors';
export type { ErrorCode } from './contract/errors';

// contract: health and demo
export { demoSchema, demoSessionSchema, healthSchema, sweepSilenceSeconds } from './contract/health';
export type { DemoSessionRequest, WireDemo, WireHealth } from './contract/health';

// contract: people
export {
  createPersonSchema,
  createdPersonSchema,
  crewMemberSchema,
  givePasswordSchema,
  oneTimeLinkSchema,
  personSchema,
  updatePersonSchema,
} from './contract/people';
export type {
  CreatePersonRequest,
  CreatedPerson,
  CrewMember,
  GivePasswordRequest,
  OneTimeLink,
  UpdatePersonRequest,
  WirePerson,
} from './contract/people';

// contract: session
export {
  badgeSchema,
  changePasswordSchema,
  changePinSchema,
  emailSchema,
  firstAdministratorSchema,
  linkSchema,
  ownBadgeSchema,
  ownSessionSchema,
  passwordTextSchema,
  phoneSchema,
  roleGrantSchema,
  sessionSchema,
  setupSchema,
  signInSchema,
  signedInPersonSchema,
  useLinkSchema,
} from './contract/session';
export type {
  ChangePasswordRequest,
  ChangePinRequest,
  FirstAdministratorRequest,
  OwnBadge,
  OwnSession,
  SessionAnswer,
  SetupAnswer,
  SignInRequest,
  SignedInPerson,
  UseLinkRequest,
  WireLink,
} from './contract/session';

export { personHeader } from './contract/person-header';

// contract: terminals
export { shippedThresholds } from './contract/shipped-thresholds';
export {
  createTerminalSchema,
  replaceTracksSchema,
  stoppingMarkerSchema,
  terminalSchema,
  terminalSettingsSchema,
  terminalQuerySchema,
  terminalThresholdsSchema,
  trackSchema,
  updateTerminalSettingsSchema,
} from './contract/terminals';
export type {
  CreateTerminalRequest,
  ReplaceTracksRequest,
  StoppingMarker,
  TerminalThresholds,
  UpdateTerminalSettingsRequest,
  WireTerminal,
  WireTerminalSettings,
  WireTrack,
} from './contract/terminals';

// contract: records
export {
  CHAIN_STATES,
  dailyHeadSchema,
  logQuerySchema,
  logStateQuerySchema,
  logStateSchema,
} from './contract/records';
export type { LogQuery, LogStateQuery, WireDailyHead, WireLogState } from './contract/records';

// contract: routes
export { ROUTES } from './contract/routes';
export type { RouteMethod, RouteSpec, TerminalPlace } from './contract/route';

// history
export { comesBackSeconds, fleetingSeconds, isStale, measureUntaken } from './history/alert-attention';
export type { RepeaterFigures, UntakenFigures } from './history/alert-attention';
export { PRECISION_VERDICTS, measurePrecision, precisionVerdict } from './history/alert-precision';
export type { CountedShare, PrecisionFigures, PrecisionVerdict } from './history/alert-precision';
export { measureAlertQuality } from './history/alert-quality';
export type { AlertQuality, AlertQualityFacts, WatchedTurnSpan } from './history/alert-quality';
export type { AlertSource, PriorityPart, TopSources } from './history/alert-sources';
export { ownLoadGoals, publishedAlertTargets, publishedPriorityMix } from './history/alert-targets';
export { measureWarning, warningEdgesMinutes } from './history/alert-warning';
export type { WarningFigures } from './history/alert-warning';
export { measureLoad } from './history/load-figures';
export type { DeskLoad, LoadFigures } from './history/load-figures';
export type { PastAlert, PastDepartureOfTurn } from './history/past-alert';
export { splitDelay } from './history/delay-split';
export type { DelayQuestion, DelaySplit } from './history/delay-split';
export { GROUPINGS, groupOnTime } from './history/grouping';
export type { Grouping, OnTimeGroup } from './history/grouping';
export { mean, standardDeviation } from './history/moments';
export { delaySecondsOf, isOnTime, measureOnTime, nameOfRule, verdictOf } from './history/on-time';
export type { Departure, OnTimeFigures, OnTimeRule } from './history/on-time';
export { quantile, quantileOfSorted } from './history/quantile';
export { wilsonInterval } from './history/wilson';
export type { ShareInterval } from './history/wilson';

// duty: who is told of an alert, and in which words
export { DUTIES, MESSAGE_CHANNELS, RUNGS, isQuiet, onDuty, shippedEscalation } from './duty/roster';
export type {
  Duty,
  DutyPerson,
  DutyRoster,
  DutyShift,
  EscalationStep,
  MessageChannel,
  QuietHours,
  Rung,
} from './duty/roster';
export { whoIsTold } from './duty/who-is-told';
export type { Told, ToldAlert } from './duty/who-is-told';
export { alertMail, alertSms, alertSubject, outcomeMail, smsLength } from './duty/alert-message';
export type { AlertMessageFacts, AlertOutcome, MailWords, TellableAlert } from './duty/alert-message';
export { plainWords } from './duty/plain-words';
export { silenceWords } from './duty/silence-message';

// contract: duty roster and messages
export {
  dutyPersonSchema,
  dutyRosterSchema,
  dutyShiftSchema,
  escalationStepSchema,
  longestShiftHours,
  quietHoursSchema,
  updateDutyRosterSchema,
} from './contract/duty';
export type { UpdateDutyRosterRequest, WireDutyRoster, WireDutyShift } from './contract/duty';
export {
  MESSAGE_STATES,
  SEND_OUTCOMES,
  boxItemSchema,
  messageBoxesSchema,
  messageSchema,
  takingSchema,
} from './contract/messages';
export type {
  MessageState,
  SendOutcome,
  WireBoxItem,
  WireMessage,
  WireMessageBoxes,
  WireTaking,
} from './contract/messages';
