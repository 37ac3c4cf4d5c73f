/** The parts of an entry's page in their order; the key is the end of the anchor of its heading. */
export const entrySections = [
  { key: 'landing', label: 'Landing' },
  { key: 'odds', label: 'Odds' },
  { key: 'result', label: 'Result' },
  { key: 'sources', label: 'Came from' },
  { key: 'process', label: 'Process' },
  { key: 'fills', label: 'Fills' },
  { key: 'lesson', label: 'Lesson' },
  { key: 'seal', label: 'Seal' },
] as const;
export type EntrySection = (typeof entrySections)[number]['key'];

export const anchorOf = (section: EntrySection): string => `section-${section}`;

/** The section an address names, if it is one. */
export const sectionNamed = (name: string | undefined): EntrySection | undefined =>
  entrySections.find(({ key }) => key === name)?.key;
