import { AlertRow } from './alerts/alert.entity';
import { AlertWatchRow } from './alerts/alert-watch.entity';
import { TakenLinkRow } from './alerts/taken-link.entity';
import { MessageTryRow } from './messages/message-try.entity';
import { MessageRow } from './messages/message.entity';
import { StepPlanRow } from './plans/step-plan.entity';
import { DailyHeadRow } from './records/daily-head.entity';
import { EntryRow } from './records/entry.entity';
import { EquipmentSetRow } from './sets/equipment-set.entity';
import { SetUnitRow } from './sets/set-unit.entity';
import { UnitRow } from './sets/unit.entity';
import { TurnRow } from './turns/turn.entity';
import { OneTimeLinkRow } from './auth/one-time-link.entity';
import { SessionRow } from './auth/session.entity';
import { SignInAttemptRow } from './auth/sign-in-attempt.entity';
import { ChangeRow } from './database/change.entity';
import { CounterRow } from './database/counter.entity';
import type { EntityClass } from './database/data-sources';
import { HistoryImportRow } from './history/history-import.entity';
import { PastDepartureRow } from './history/past-departure.entity';
import { SettingRow } from './database/setting.entity';
import { PersonRoleRow } from './people/person-role.entity';
import { PersonRow } from './people/person.entity';
import { TerminalRow } from './terminals/terminal.entity';
import { TrackRow } from './terminals/track.entity';
import { TimetableActivationRow } from './timetables/timetable-activation.entity';
import { TimetableContentRow } from './timetables/timetable-content.entity';
import { TimetableDayRow } from './timetables/timetable-day.entity';
import { TimetableTerminalRow } from './timetables/timetable-terminal.entity';
import { TimetableRow } from './timetables/timetable.entity';

/** Every table, by area. */
export const ENTITIES: EntityClass[] = [
  // database
  ChangeRow,
  CounterRow,
  SettingRow,
  // auth
  OneTimeLinkRow,
  SessionRow,
  SignInAttemptRow,
  // people
  PersonRow,
  PersonRoleRow,
  // terminals
  TerminalRow,
  TrackRow,
  // plans, sets, turns, records, alerts
  StepPlanRow,
  EquipmentSetRow,
  UnitRow,
  SetUnitRow,
  TurnRow,
  EntryRow,
  DailyHeadRow,
  AlertRow,
  AlertWatchRow,
  TakenLinkRow,
  // messages
  MessageRow,
  MessageTryRow,
  // history
  HistoryImportRow,
  PastDepartureRow,
  // timetables
  TimetableRow,
  TimetableContentRow,
  TimetableActivationRow,
  TimetableTerminalRow,
  TimetableDayRow,
];
