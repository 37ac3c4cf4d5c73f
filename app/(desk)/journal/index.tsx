/** The list itself is the journal's layout; nothing is chosen here. */
export default function JournalRoute() {
  return null;
}
