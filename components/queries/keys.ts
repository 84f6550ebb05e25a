/** Keys of every query, from the resource to the detail; invalidating a resource reaches all below it. */
export const keys = {
  me: ['me'] as const,
};
