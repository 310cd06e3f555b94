import { checkScreens } from "../support/check-screens.ts";

checkScreens("phone");
