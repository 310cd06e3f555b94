import type { Browser } from "playwright-core";
import { entrance } from "./drivers/entrance.ts";
import { testPassword } from "./factories/person.ts";
import { type Seat, type SeatSize, takeSeat } from "./seat.ts";

/** Someone in front of a screen who has signed in with the password that all test people have. */
export async function takeSignedInSeat(
  browser: Browser,
  { baseUrl, email, size = "desk" }: { baseUrl: string; email: string; size?: SeatSize },
): Promise<Seat> {
  const seat = await takeSeat(browser, { baseUrl, size });
  await entrance(seat.page).signIn({ email, password: testPassword });
  return seat;
}
