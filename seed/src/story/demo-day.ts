import type { Instant } from '@stubpost/shared';
import { millisecondsInHour, millisecondsInMinute } from '@stubpost/shared';
import { randomOf } from '../railroad/random';

/** What is special about a day of the demo; follows from the date alone. */
export interface DemoDay {
  serviceDate: string;
  /** Air charges slowly before nine. */
  coldMorning: boolean;
  /** A week with several times the usual number of incidents on the line. */
  badWeek: boolean;
}

const dayNumber = (serviceDate: string): number =>
  Math.floor(Date.parse(`${serviceDate}T00:00:00Z`) / (24 * millisecondsInHour));

/** One week in nine is bad, so that eight weeks of history usually hold one. */
const weeksBetweenBadWeeks = 9;

/** The character of a service date. */
export function demoDay(serviceDate: string): DemoDay {
  const month = Number(serviceDate.slice(5, 7));
  const winter = month >= 11 || month <= 3;
  return {
    serviceDate,
    coldMorning: winter && randomOf(`cold|${serviceDate}`).next() < 0.35,
    badWeek: Math.floor(dayNumber(serviceDate) / 7) % weeksBetweenBadWeeks === 4,
  };
}

/** A running number for the day, for moving sets and crews on. */
export function dayOrdinal(serviceDate: string): number {
  return dayNumber(serviceDate);
}

/** Hour of the day at the railroad, by its scheduled minutes since the service day began. */
export function hourAt(instant: Instant, dayStartsAt: Instant): number {
  return (instant - dayStartsAt) / millisecondsInHour;
}

/** The rush hours in which riders slow the trains down. */
export function isRush(hour: number): boolean {
  return (hour >= 7 && hour < 9.5) || (hour >= 16 && hour < 18.75);
}

/** Minutes as milliseconds. */
export const minutes = (count: number): number => count * millisecondsInMinute;
