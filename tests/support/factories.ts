import { hashPassword } from 'better-auth/crypto';
import type { Database } from '../../db/client';
import { accounts, labMemberships, labs, userRoles, users } from '../../db/schema/index';
import type { Role } from '../../shared/contracts/vocabulary';

/** People and labs of a test, written straight into the tables; signing in goes through HTTP. */

export const testPassword = 'a-password-for-tests';
// One hash for everybody: a hash takes a tenth of a second and a file makes many people.
let hashed: Promise<string> | undefined;

export interface TestPerson {
  id: string;
  name: string;
  email: string;
  labId: string | null;
}

export interface NewPerson {
  name?: string;
  email?: string;
  roles?: readonly Role[];
  labId?: string | null;
  /** First day of the membership; long ago by default. */
  fromDay?: string;
  untilDay?: string | null;
  orcid?: string | null;
  emailVerified?: boolean;
  demonstration?: boolean;
}

let serial = 0;

export async function makeLab(db: Database, name = `Laboratory ${(serial += 1)}`, demonstration = false): Promise<{ id: string; name: string }> {
  const [row] = await db.insert(labs).values({ name, place: 'Nowhere', demonstration }).returning({ id: labs.id, name: labs.name });
  if (row === undefined) throw new Error('The laboratory was not written.');
  return row;
}

export async function makePerson(db: Database, person: NewPerson = {}): Promise<TestPerson> {
  serial += 1;
  hashed ??= hashPassword(testPassword);
  const name = person.name ?? `Person ${serial}`;
  const email = person.email ?? `person${serial}@test.example`;
  const { orcid = null, emailVerified = true, demonstration = false } = person;
  const [row] = await db.insert(users).values({ name, email, orcid, emailVerified, demonstration }).returning({ id: users.id });
  if (row === undefined) throw new Error('The person was not written.');
  await db.insert(accounts).values({ userId: row.id, accountId: row.id, providerId: 'credential', password: await hashed });
  for (const role of person.roles ?? []) await db.insert(userRoles).values({ userId: row.id, role });
  const labId = person.labId ?? null;
  if (labId !== null) await db.insert(labMemberships).values({ userId: row.id, labId, fromDay: person.fromDay ?? '2020-01-01', untilDay: person.untilDay ?? null });
  return { id: row.id, name, email, labId };
}
