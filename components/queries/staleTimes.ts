/** How long an answer counts as fresh, in ms, by how its resource changes. */
export const staleTimes = {
  /** A frozen version never changes. */
  frozen: Infinity,
  /** Public pages change when a version is frozen. */
  published: 5 * 60_000,
  /** What people work on now. */
  working: 15_000,
  account: 60_000,
} as const;
