import { useSyncExternalStore } from 'react';
import { flushSync } from 'react-dom';
import { useColorScheme } from 'react-native';
import { darkColours, lightColours, type Colours } from '@/components/ui/theme/colours';

/** The colours of the scheme the reader's system asks for; paper is always light. */
export function useColours(): Colours {
  const prints = useSyncExternalStore(onPrinting, readPrinting);
  return useColorScheme() === 'dark' && !prints ? darkColours : lightColours;
}

let isPrinting = false;
const readPrinting = () => isPrinting;
const listeners = new Set<() => void>();

function onPrinting(onChange: () => void): () => void {
  if (listeners.size === 0) for (const type of printEvents) window.addEventListener(type, follow);
  listeners.add(onChange);
  return () => {
    listeners.delete(onChange);
    if (listeners.size === 0) for (const type of printEvents) window.removeEventListener(type, follow);
  };
}

const printEvents = ['beforeprint', 'afterprint'] as const;

/** The browser takes its picture of the page as soon as this returns, so that all must be drawn by then. */
function follow({ type }: Event): void {
  isPrinting = type === 'beforeprint';
  flushSync(() => {
    for (const onChange of listeners) onChange();
  });
}
