import { useRef, type KeyboardEvent } from 'react';
import { type View } from 'react-native';

interface Options {
  readonly count: number;
  readonly current: number;
  readonly onMove: (index: number) => void;
  /** Whether an item takes part; all do unless told. */
  readonly isOpen?: (index: number) => boolean;
}

const steps: Readonly<Record<string, number>> = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1 };

/** One tab stop for a row of choices: arrows move the choice and the focus, Home and End go to the ends. */
export function useArrowKeys({ count, current, onMove, isOpen = () => true }: Options) {
  const items = useRef<(View | null)[]>([]);
  const onKeyDown = (event: KeyboardEvent) => {
    const next = targetOf(event.key, { count, current, isOpen });
    if (next === null) return;
    event.preventDefault();
    if (next === current) return;
    onMove(next);
    items.current[next]?.focus();
  };
  const itemRef = (index: number) => (item: View | null) => {
    items.current[index] = item;
  };
  return { onKeyDown, itemRef };
}

type Place = Required<Pick<Options, 'count' | 'current' | 'isOpen'>>;

function targetOf(key: string, { count, current, isOpen }: Place): number | null {
  const open = Array.from({ length: count }, (_, index) => index).filter(isOpen);
  if (key === 'Home') return open[0] ?? null;
  if (key === 'End') return open.at(-1) ?? null;
  const step = steps[key];
  if (step === undefined || open.length === 0) return null;
  const place = open.indexOf(current);
  // With nothing chosen yet, forwards begins at the first and backwards at the last.
  if (place < 0) return step > 0 ? (open[0] ?? null) : (open.at(-1) ?? null);
  return open[(place + step + open.length) % open.length] ?? null;
}
