/** An equipment set of the demo: a locomotive, coaches and a cab car, in order from the locomotive. */
export interface DemoSet {
  label: string;
  units: ReadonlyArray<{
    number: string;
    kind: 'locomotive' | 'coach' | 'cab-car';
    lengthFeet: number;
    tons: number;
  }>;
}

const setCount = 24;

function demoSet(index: number): DemoSet {
  const coaches = 4 + (index % 3);
  const first = 2100 + index * 10;
  return {
    label: String(11 + index),
    units: [
      { number: String(3301 + index), kind: 'locomotive', lengthFeet: 64, tons: 134 },
      ...Array.from({ length: coaches }, (_, coach) => ({
        number: String(first + coach),
        kind: 'coach' as const,
        lengthFeet: 85,
        tons: 52,
      })),
      { number: String(4101 + index), kind: 'cab-car', lengthFeet: 85, tons: 54 },
    ],
  };
}

/** Sets 11 to 34, five to seven vehicles behind the locomotive each. Lengths and weights are examples. */
export const demoSets: readonly DemoSet[] = Array.from({ length: setCount }, (_, index) => demoSet(index));

/** The set that works a block on a day: sets move on by one each day, so that every set sees every block. */
export function setOfBlock(blockIndex: number, dayNumber: number): DemoSet {
  const set = demoSets[(blockIndex + dayNumber) % setCount];
  if (!set) throw new Error(`no set for block ${blockIndex}`);
  return set;
}
