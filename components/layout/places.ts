import type { Href } from 'expo-router';

/** A place of the app: a named point on the axis. */
export interface Place {
  label: string;
  href: Href;
  /** First parts of the addresses that belong to it. */
  sections: readonly string[];
  /** How many things wait there. */
  waiting: number;
}

interface PlacesOf {
  roles: readonly string[];
  waiting: { submissions?: number; review?: number; curate?: number };
}

const register: Place = { label: 'Register', href: '/', sections: ['', 'species', 'records', 'changes', 'search', 'calculator'], waiting: 0 };
const scaling: Place = { label: 'Scaling', href: '/scaling' as Href, sections: ['scaling'], waiting: 0 };
const bench: Place = { label: 'Bench', href: '/bench' as Href, sections: ['bench'], waiting: 0 };
const versions: Place = { label: 'Versions', href: '/versions' as Href, sections: ['versions'], waiting: 0 };

const deskSections = ['desk', 'submissions', 'review', 'rechecks', 're-checks', 'curate', 'people', 'taxa', 'trees', 'freeze', 'labs', 'audit', 'outbox'];

/** The fourth place by roles: their own one, or a desk with all of them for who holds several. */
function fourthPlace({ roles, waiting }: PlacesOf): Place | null {
  const { submissions = 0, review = 0, curate = 0 } = waiting;
  const own: Place[] = [];
  if (roles.includes('contributor')) own.push({ label: 'Submissions', href: '/submissions' as Href, sections: deskSections, waiting: submissions });
  if (roles.includes('reviewer')) own.push({ label: 'Review', href: '/review' as Href, sections: deskSections, waiting: review });
  if (roles.includes('curator')) own.push({ label: 'Curate', href: '/curate' as Href, sections: deskSections, waiting: curate });
  if (roles.includes('administrator')) own.push({ label: 'People', href: '/people' as Href, sections: deskSections, waiting: 0 });
  if (own.length <= 1) return own[0] ?? null;
  return { label: 'Desk', href: '/desk' as Href, sections: deskSections, waiting: own.reduce((sum, place) => sum + place.waiting, 0) };
}

/** The places in their order along the axis, four or five of them. */
export function placesFor(account: PlacesOf): Place[] {
  const fourth = fourthPlace(account);
  return fourth ? [register, scaling, bench, fourth, versions] : [register, scaling, bench, versions];
}

/** The index of the place an address belongs to, or null for one outside the places (sign-in). */
export function placeOfPath(places: readonly Place[], path: string): number | null {
  const first = path.split('/')[1] ?? '';
  const index = places.findIndex((place) => place.sections.includes(first));
  return index < 0 ? null : index;
}

/** "Submissions, 2 waiting": what a screen reader hears. */
export function spokenPlace(place: Place): string {
  return place.waiting > 0 ? `${place.label}, ${place.waiting} waiting` : place.label;
}
