/** What an operator ticks before an order goes on the machine; ids are stored with the event. */
export const CHECKLIST = [
  { id: 'material', words: 'The blank is the one on the ticket, and lies as drawn.' },
  { id: 'focus', words: 'File, power, speed, passes and focus are as on the ticket; nothing is rescaled.' },
  {
    id: 'extraction',
    words: 'Covers are closed, extraction is on, eye protection and extinguisher are at hand.',
  },
  { id: 'attended', words: 'I stay with the machine while it runs.' },
] as const;

/** Items that a ticked list leaves out, in order. */
export function untickedItems(ticked: readonly string[]): string[] {
  return CHECKLIST.filter(({ id }) => !ticked.includes(id)).map(({ words }) => words);
}
