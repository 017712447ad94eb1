/** What a link in a message is for, as its token is made from it: one link for one alert and one person. */
export function takingPurpose(alertId: string, personId: string): string {
  return `take alert ${alertId} as ${personId}`;
}
