/** Seconds between two `beat` events, so that a reader can tell a quiet board from a lost stream. Our choice. */
export const beatSeconds = 5;
/** Without any event for this long the board says that it is not live. Our choice: twice the beat. */
export const notLiveAfterSeconds = 10;
