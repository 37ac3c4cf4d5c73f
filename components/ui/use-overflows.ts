import { useEffect, useRef, useState } from 'react';

/** Whether the content of an element is wider than the element, so that it must be reachable to scroll by keyboard. */
export function useOverflows() {
  const ref = useRef<HTMLDivElement>(null);
  const [overflows, setOverflows] = useState(false);
  useEffect(() => {
    const element = ref.current;
    if (element === null || typeof ResizeObserver === 'undefined') return;
    const observer = new ResizeObserver(() => setOverflows(element.scrollWidth > element.clientWidth + 1));
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return { ref, overflows };
}
