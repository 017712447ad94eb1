import { randomUUID } from 'node:crypto';
import { writeFile } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import type { INestApplicationContext } from '@nestjs/common';
import {
  Clock,
  PlansService,
  Reader,
  SetsService,
  TerminalsService,
  TimetableActivations,
  TimetableDays,
  TimetableImports,
} from '@stubpost/service';
import {
  addDays,
  defaultStepPlanKey,
  defaultStepPlanName,
  railRouteTypes,
  type CalendarDate,
  type PutSetRequest,
} from '@stubpost/shared';
import { zipSync } from 'fflate';
import { demoTerminals, demoZone, type DemoTerminal } from '../railroad/geography';
import { demoPlanSteps } from '../railroad/instructions';
import { demoSets } from '../railroad/sets';
import { demoTimetableFiles } from '../railroad/timetable-files';
import type { Cast } from './cast';

/** From when the demo has history, and which day it is. */
export interface DemoCalendar {
  firstDay: CalendarDate;
  today: CalendarDate;
}

/** The timetable runs on for as long as anybody may keep a demo. */
const daysAhead = 730;
const fileName = 'ostrel-valley.zip';

/** Opens the turns of one service date as the demo's timetable plans them. */
export function openDemoDay(app: INestApplicationContext, serviceDate: CalendarDate): Promise<void> {
  return app.get(TimetableDays).open(serviceDate);
}

/** Makes the terminals that are not there yet, so that people can have roles at them. */
export async function ensureTerminals(app: INestApplicationContext): Promise<void> {
  const known = await app.get(Reader).query<{ code: string }>('SELECT code FROM terminal');
  for (const terminal of demoTerminals) {
    const { code, name } = terminal;
    if (known.some((row) => row.code === code)) continue;
    await app.get(TerminalsService).add({ code, name, zone: demoZone });
    await app.get(TerminalsService).replaceTracks(code, tracksOf(terminal));
  }
}

/** Makes sets and timetable unless they are there. Broken off, it goes on at the next start. */
export async function prepareRailroad(
  app: INestApplicationContext,
  cast: Cast,
  calendar: DemoCalendar,
): Promise<void> {
  await describeSets(app);
  const orders = await app.get(Reader).query('SELECT 1 FROM timetable_activation LIMIT 1');
  if (orders.length > 0) return;
  await writeInstructions(app, cast, calendar.firstDay);
  const administrator = cast.withRole('administrator')[0];
  if (administrator === undefined) throw new Error('the demo has no administrator');
  const timetableId = await importTimetable(app, calendar, administrator.name);
  const terminals = demoTerminals.map(({ code, name, stationId }) => ({
    code,
    name,
    stationIds: [stationId],
  }));
  await app
    .get(TimetableActivations)
    .activate(timetableId, { from: calendar.firstDay, terminals }, administrator);
}

/** Puts the railroad's own words on the steps of its plans, where nobody has made a version yet. */
async function writeInstructions(
  app: INestApplicationContext,
  cast: Cast,
  effectiveFrom: CalendarDate,
): Promise<void> {
  const plans = app.get(PlansService);
  const now = app.get(Clock).now();
  const authorName = cast.withRole('supervisor')[0]?.name;
  if (authorName === undefined) throw new Error('the demo has no supervisor');
  for (const { code } of demoTerminals) {
    const known = await plans.listAt(code, now);
    if (known.some((plan) => plan.createdBy !== null)) continue;
    const request = {
      key: defaultStepPlanKey,
      name: defaultStepPlanName,
      effectiveFrom,
      steps: demoPlanSteps,
    };
    await plans.create({ terminalCode: code, request, authorName, now });
  }
}

/** Stopping markers for trains of four cars up to what the platform holds; an example, labelled by the cars. */
function tracksOf(terminal: DemoTerminal) {
  return terminal.tracks.map((track) => ({
    ...track,
    markers: Array.from({ length: track.cars - 3 }, (_, index) => ({
      cars: 4 + index,
      label: String(4 + index),
    })),
  }));
}

async function describeSets(app: INestApplicationContext): Promise<void> {
  const known = new Set((await app.get(SetsService).list()).map((set) => set.label));
  const now = app.get(Clock).now();
  for (const { label, units } of demoSets) {
    if (known.has(label)) continue;
    const request: PutSetRequest = { units: [...units], leadingUnit: units.at(-1)?.number ?? null };
    await app.get(SetsService).put({ label, request, now });
  }
}

/** Imports the demo's timetable by the same way as everybody's: a zip that is uploaded, read and checked. */
async function importTimetable(
  app: INestApplicationContext,
  { firstDay, today }: DemoCalendar,
  uploadedBy: string,
): Promise<string> {
  const files = demoTimetableFiles({ from: firstDay, to: addDays(today, daysAhead) });
  const encoder = new TextEncoder();
  const zip = zipSync(
    Object.fromEntries(Object.entries(files).map(([name, text]) => [name, encoder.encode(text)])),
  );
  const file = path.join(tmpdir(), `stubpost-demo-${randomUUID()}.zip`);
  await writeFile(file, zip);
  const imports = app.get(TimetableImports);
  const id = await imports.start(
    { path: file, originalname: fileName, size: zip.length },
    railRouteTypes,
    uploadedBy,
  );
  await imports.settled();
  return id;
}
