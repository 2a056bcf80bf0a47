/** What the sanitiser takes out, by kind. */
const SENTENCES = {
  script: 'Scripts were taken out.',
  handler: 'Event handlers were taken out.',
  'foreign-object': 'Embedded web content (foreignObject) was taken out.',
  animation: 'Animations were taken out; the drawing stands as it is before they start.',
  'remote-reference': 'References to files or addresses outside the drawing were taken out.',
  import: 'Imported style sheets were taken out.',
  'embedded-font': 'Fonts carried inside the drawing are not read; turn such text into outlines.',
  'embedded-picture': 'Embedded pictures of a kind that we do not read (only PNG and JPEG) were taken out.',
  entities: 'Entity declarations were taken out.',
  unknown: 'Elements that no drawing needs were taken out.',
} as const;

export type RemovedKind = keyof typeof SENTENCES;

/** Sentences for what was taken out, each once, in a fixed order. */
export function removedInWords(kinds: ReadonlySet<RemovedKind>): string[] {
  return (Object.keys(SENTENCES) as RemovedKind[])
    .filter((kind) => kinds.has(kind))
    .map((kind) => SENTENCES[kind]);
}
