/** First letters of the first and the last word of a name: "Mara Quill" is "MQ". */
export function initialsOf(name: string): string {
  const words = name.trim().split(/\s+/);
  const ends = words.length > 1 ? [words[0], words.at(-1)] : words;
  return ends.map((word) => [...(word ?? '')][0]?.toUpperCase() ?? '').join('');
}
