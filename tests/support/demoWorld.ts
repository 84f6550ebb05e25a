import { findUserIdByEmail } from '../../db/queries/demo';
import { seedDemo } from '../../server/seed/demo/seedDemo';
import { demoContent } from '../../server/seed/demo/demoContent';
import { readDemonstration } from '../../server/seed/demo/demonstration';
import type { Actor } from '../../server/context';
import type { SpecimenContent } from '../../shared/contracts/content';
import { createClient, signInCookie, type TestClient } from './client';
import type { TestApp } from './testApp';

export type DemoPerson = 'contributor' | 'reviewer' | 'curator' | 'administrator' | 'bram.oduya' | 'mei.castellan';

/** The demonstration of a register, its people as clients and as actors. */
export interface DemoWorld {
  client(person: DemoPerson, url?: string): Promise<TestClient>;
  actor(person: DemoPerson): Promise<Actor>;
  /** A whole specimen that may be submitted, under a code of its own. */
  specimen(code: string): SpecimenContent;
}

export async function makeDemoWorld(app: TestApp): Promise<DemoWorld> {
  await seedDemo(app.context);
  const entry = readDemonstration().entries.find((one) => one.key === 'waiting');
  if (entry === undefined) throw new Error('The demonstration has an entry that waits.');
  const cookies = new Map<DemoPerson, string>();
  return {
    async client(person, url = app.url) {
      const cookie = cookies.get(person) ?? (await signInCookie(app.url, `${person}@demo.example`, app.context.config.demoPassword));
      cookies.set(person, cookie);
      return createClient(url, cookie);
    },
    async actor(person) {
      const id = (await findUserIdByEmail(app.context.db, `${person}@demo.example`)) ?? '';
      return app.actor({ id, name: '', email: '', labId: null });
    },
    specimen: (code) => demoContent({ ...entry, code }),
  };
}
