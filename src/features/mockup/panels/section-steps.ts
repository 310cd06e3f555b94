/** How near a layer dragged in the section must come to what it catches on, px. */
export const catchPx = 7;
/** What an arrow with Shift moves it by, mm. */
export const fineStepMm = 0.5;
