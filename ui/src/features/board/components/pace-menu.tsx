import { Button, ButtonGroup, Menu, MenuItem, Popover } from '@blueprintjs/core';

/** Seconds between two pictures. */
export const PACES = [1, 5, 30] as const;
export type Pace = (typeof PACES)[number];

const paceWords: Record<Pace, string> = {
  1: 'Moves every second',
  5: 'Moves every 5 seconds',
  30: 'Moves every 30 seconds',
};

export interface PaceMenuProps {
  pace: Pace;
  /** Clock time since which the picture stands; null while it moves. */
  pausedAt: string | null;
  onPace: (pace: Pace) => void;
  onPause: () => void;
}

/** Stops the picture, or slows it. Alerts come all the same. */
export function PaceMenu({ pace, pausedAt, onPace, onPause }: PaceMenuProps) {
  return (
    <ButtonGroup>
      <Button aria-pressed={pausedAt !== null} onClick={onPause}>
        {pausedAt === null ? 'Pause picture' : `Paused ${pausedAt}`}
      </Button>
      <Popover
        placement="bottom-end"
        minimal
        content={
          <Menu>
            {PACES.map((each) => (
              <MenuItem
                key={each}
                text={paceWords[each]}
                roleStructure="listoption"
                selected={each === pace}
                onClick={() => onPace(each)}
              />
            ))}
          </Menu>
        }
        renderTarget={({ isOpen, ref, ...target }) => (
          <Button
            {...target}
            ref={ref}
            aria-expanded={isOpen}
            aria-label={`How often the picture moves: ${pace} s`}
          >
            {pace} s
          </Button>
        )}
      />
    </ButtonGroup>
  );
}
