import type { Transaction } from "sequelize";
import { newId } from "../db/new-id.ts";
import { Person } from "../models/person.ts";

/** The person of an address, made when there is none; right even when two requests bring the same new address at once. */
export async function findOrCreatePerson(
  { now, transaction }: { now: Date; transaction: Transaction },
  { email, name }: { email: string; name: string },
): Promise<Person> {
  await Person.bulkCreate([{ id: newId(), email, name, createdAt: now }], { ignoreDuplicates: true, transaction });
  const person = await Person.findOne({ where: { email }, transaction });
  if (!person) throw new Error("A person just made is not there.");
  return person;
}
