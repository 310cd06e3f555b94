import { hashPassword } from "#server/auth/passwords.ts";
import { newId } from "#server/db/new-id.ts";
import { Person } from "#server/models/person.ts";
import { unique } from "./unique.ts";

/** The password of everyone that buildPerson() makes with one. */
export const testPassword = "heron-on-the-weir";
let testHash: Promise<string> | undefined;

/** Someone with a password whose address is proven. */
export async function buildPerson(
  overrides: Partial<Pick<Person, "email" | "name" | "passwordHash" | "addressProvenAt">> = {},
): Promise<Person> {
  testHash ??= hashPassword(testPassword);
  const number = unique();
  return Person.create({
    id: newId(),
    email: `person${number}@people.example`,
    name: `Person ${number}`,
    passwordHash: await testHash,
    addressProvenAt: new Date(),
    createdAt: new Date(),
    ...overrides,
  });
}
