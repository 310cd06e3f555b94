import { queueReminders } from "../commands/queue-reminders.ts";
import type { Services } from "../http/context.ts";

/** Looks whom to remind that a yes is needed. */
export async function remind(services: Services): Promise<void> {
  await queueReminders({ services, now: new Date() });
}
