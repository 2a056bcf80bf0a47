/** What tasks are about, as the queue names it. */
export const artworkSubject = (artworkId: number): string => `artwork ${artworkId}`;
export const preparationSubject = (preparationId: number): string => `preparation ${preparationId}`;
