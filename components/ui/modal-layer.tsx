import { useLayoutEffect, useRef, type CSSProperties, type KeyboardEvent, type ReactNode } from 'react';

interface Props {
  readonly labelledBy: string;
  readonly onClose: () => void;
  readonly style: CSSProperties;
  readonly children: ReactNode;
}

const focusableSelector =
  'a[href], button:not([disabled]), input:not([disabled]), select:not([disabled]), textarea:not([disabled]), [tabindex]:not([tabindex="-1"])';

const focusables = (layer: HTMLElement) =>
  [...layer.querySelectorAll<HTMLElement>(focusableSelector)].filter((element) => element.tabIndex >= 0);

/**
 * A layer above the page, in the browser's top layer, so that no stacking of the page reaches it: it keeps the focus until it closes,
 * closes on Escape and gives the focus back to where it came from.
 */
export function ModalLayer({ labelledBy, onClose, style, children }: Props) {
  const layer = useRef<HTMLDialogElement>(null);
  useLayoutEffect(() => {
    const element = layer.current;
    if (element === null) return;
    const before = document.activeElement;
    // Older browsers and jsdom know the element but not its modal way; the trap below holds there as well.
    if (typeof element.showModal === 'function') element.showModal();
    else element.setAttribute('open', '');
    (focusables(element)[0] ?? element).focus();
    return () => {
      if (typeof element.close === 'function') element.close();
      if (before instanceof HTMLElement) before.focus();
    };
  }, []);
  const onKeyDown = (event: KeyboardEvent<HTMLDialogElement>) => {
    // A press in the list of a select or a date belongs to that list.
    if (event.defaultPrevented) return;
    if (event.key === 'Escape') {
      event.preventDefault();
      onClose();
    } else if (event.key === 'Tab') {
      keepInside(event, event.currentTarget);
    }
  };
  return (
    <dialog
      ref={layer}
      aria-modal
      aria-labelledby={labelledBy}
      tabIndex={-1}
      onKeyDown={onKeyDown}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      style={{ border: 0, padding: 0, boxSizing: 'border-box', ...style }}
    >
      {children}
    </dialog>
  );
}

function keepInside(event: KeyboardEvent, layer: HTMLElement): void {
  const inside = focusables(layer);
  const first = inside[0];
  const last = inside.at(-1);
  const active = document.activeElement;
  if (first === undefined || last === undefined) {
    event.preventDefault();
  } else if (event.shiftKey && (active === first || active === layer)) {
    event.preventDefault();
    last.focus();
  } else if (!event.shiftKey && active === last) {
    event.preventDefault();
    first.focus();
  }
}
