import { type CSSProperties, type ReactNode } from 'react';

const hidden: CSSProperties = {
  position: 'absolute',
  width: 1,
  height: 1,
  margin: -1,
  padding: 0,
  border: 0,
  overflow: 'hidden',
  clipPath: 'inset(50%)',
  whiteSpace: 'nowrap',
};

/** Words for screen readers only. */
export function HiddenText({ id, children }: { id?: string; children: ReactNode }) {
  return (
    <span id={id} style={hidden}>
      {children}
    </span>
  );
}
