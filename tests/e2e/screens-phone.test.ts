import { checkScreens } from "../support/check-screens.ts";
import { atTheDesk } from "../support/screen-table.ts";

// Clients, guests and reps: those who have a phone in their hand. The shop's own on a phone: tests/long.
checkScreens("phone", (who) => !atTheDesk.has(who));
