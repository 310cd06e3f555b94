import { mockupPolicy } from "./mockup.ts";

/** Drafts are looked at and changed by those who look at and change the mockup. */
export const namedDraftPolicy = { see: mockupPolicy.see, change: mockupPolicy.edit };
