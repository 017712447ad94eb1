import type { MigrationInterface } from 'typeorm';
import { CreateFoundation1764600000000 } from './1764600000000-create-foundation';
import { CreatePeople1764600001000 } from './1764600001000-create-people';
import { CreateTerminals1764600002000 } from './1764600002000-create-terminals';
import { CreatePlans1764600010000 } from './1764600010000-create-plans';
import { CreateTurns1764600011000 } from './1764600011000-create-turns';
import { CreateEntries1764600012000 } from './1764600012000-create-entries';
import { CreateSets1764600013000 } from './1764600013000-create-sets';
import { CreateAlerts1764600014000 } from './1764600014000-create-alerts';
import { CreateHistory1764600030000 } from './1764600030000-create-history';
import { CreateTimetables1764600040000 } from './1764600040000-create-timetables';
import { CreateMessages1764810000000 } from './1764810000000-create-messages';
import { AddBadges1764700000000 } from './1764700000000-add-badges';
import { CreateDailyHeads1764600050000 } from './1764600050000-create-daily-heads';
import { CountCorrections1764600055000 } from './1764600055000-count-corrections';

/** Every migration in the order it runs. Never edited once merged; only added to. */
export const MIGRATIONS: (new () => MigrationInterface)[] = [
  CreateFoundation1764600000000,
  CreatePeople1764600001000,
  CreateTerminals1764600002000,
  CreatePlans1764600010000,
  CreateTurns1764600011000,
  CreateEntries1764600012000,
  CreateSets1764600013000,
  CreateAlerts1764600014000,
  CreateHistory1764600030000,
  CreateTimetables1764600040000,
  AddBadges1764700000000,
  CreateDailyHeads1764600050000,
  CountCorrections1764600055000,
  CreateMessages1764810000000,
];
