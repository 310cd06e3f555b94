import { checkScreens } from "../support/check-screens.ts";
import { atTheDesk } from "../support/screen-table.ts";

checkScreens("phone", (who) => atTheDesk.has(who));
