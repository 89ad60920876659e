let given = 0;

/** An id that no other element of this page has. */
export const ownId = (kind: string): string => `${kind}-${(given += 1)}`;
