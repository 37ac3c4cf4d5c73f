/** Items by each of their keys, in the order the keys come. */
export function grouped<Item>(items: readonly Item[], keysOf: (item: Item) => readonly string[]): Map<string, Item[]> {
  const groups = new Map<string, Item[]>();
  for (const item of items) {
    for (const key of new Set(keysOf(item))) {
      const group = groups.get(key);
      if (group === undefined) groups.set(key, [item]);
      else group.push(item);
    }
  }
  return groups;
}
