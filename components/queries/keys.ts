/** Keys of every query, from the resource to the detail; invalidating a resource reaches all below it. */
export const keys = {
  me: ['me'] as const,
  notices: ['notices'] as const,
  register: ['register'] as const,
  structures: ['structures'] as const,
  taxa: { all: ['taxa'] as const, search: (query: object) => ['taxa', 'search', query] as const, one: (id: string) => ['taxa', 'one', id] as const },
  species: { all: ['species'] as const, list: (query: object) => ['species', 'list', query] as const, page: (slug: string, version: string | null) => ['species', 'page', slug, version] as const },
  records: { all: ['records'] as const, page: (number: string) => ['records', 'page', number] as const },
  scaling: { all: ['scaling'] as const, fit: (query: object) => ['scaling', 'fit', query] as const, place: (query: object) => ['scaling', 'place', query] as const },
  versions: { all: ['versions'] as const, list: ['versions', 'list'] as const, page: (label: string) => ['versions', 'page', label] as const, citation: (query: object) => ['versions', 'citation', query] as const },
  submissions: {
    all: ['submissions'] as const,
    list: (query: object) => ['submissions', 'list', query] as const,
    one: (id: string) => ['submissions', 'one', id] as const,
    preview: (content: unknown) => ['submissions', 'preview', content] as const,
  },
  review: { all: ['review'] as const, queue: ['review', 'queue'] as const, one: (id: string) => ['review', 'one', id] as const },
  rechecks: { all: ['rechecks'] as const, list: (query: object) => ['rechecks', 'list', query] as const, one: (id: string) => ['rechecks', 'one', id] as const },
  curate: { all: ['curate'] as const, waits: ['curate', 'waits'] as const, setAsides: ['curate', 'setAsides'] as const, preview: ['curate', 'preview'] as const, progress: ['curate', 'progress'] as const },
  people: { all: ['people'] as const, list: (query: object) => ['people', 'list', query] as const, labs: ['people', 'labs'] as const, audit: (query: object) => ['people', 'audit', query] as const, outbox: ['people', 'outbox'] as const },
};
