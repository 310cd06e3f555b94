import { mockupPolicy } from "./mockup.ts";

/** Photos of the wall are looked at and brought in by those who look at and change the mockup that is shown on them. */
export const wallPhotoPolicy = { see: mockupPolicy.see, change: mockupPolicy.edit };
