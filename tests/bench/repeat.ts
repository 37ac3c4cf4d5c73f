/** Goes round the list `count` items long, adding up what each item gives. */
export function repeatOver<Item>(items: readonly Item[], figureOf: (item: Item) => number): (count: number) => number {
  return (count) => {
    let sum = 0;
    for (let done = 0; done < count;) {
      for (const item of items) {
        if (done === count) break;
        sum += figureOf(item);
        done += 1;
      }
    }
    return sum;
  };
}

/** As many passes over whole columns as `count` items need; what the last does beyond them is not counted. */
export function repeatColumns(length: number, pass: () => number): (count: number) => number {
  return (count) => {
    let sum = 0;
    for (let done = 0; done < count; done += length) sum += pass();
    return sum;
  };
}
