import { type Draw } from '@/tests/journal/any-input/draw';

/** A call with drawn arguments, and these arguments for the message. */
export interface Prepared {
  readonly prepare: (draw: Draw) => { readonly input: unknown; readonly call: () => unknown };
  /** How many times as long as most a call takes: it is made so many times less often. */
  readonly cost: number;
}

/** Ties a function to how its one argument is drawn. */
export function given<Input>(drawInput: (draw: Draw) => Input, compute: (input: Input) => unknown, cost = 1): Prepared {
  return {
    cost,
    prepare: (draw) => {
      const input = drawInput(draw);
      return { input, call: () => compute(input) };
    },
  };
}
