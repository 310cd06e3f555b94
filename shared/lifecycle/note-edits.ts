/** How long an author may put right what they wrote, ms: long enough for a slip, too short to change what others answered. */
const editableMs = 5 * 60_000;

/** Until when something written at `writtenAt` can be changed by its author. */
export const editableUntil = (writtenAt: Date): Date => new Date(writtenAt.getTime() + editableMs);

/** Whether it can be changed at `now`. A clock that went back makes nothing older than it is. */
export const isEditable = (writtenAt: Date, now: Date): boolean => now < editableUntil(writtenAt);
