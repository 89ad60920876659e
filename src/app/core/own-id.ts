let given = 0;

/** An id that nothing else on this page has. */
export const ownId = (kind: string): string => `${kind}-${(given += 1)}`;
