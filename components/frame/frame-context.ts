import { createContext } from 'react';

interface FrameShape {
  /** Takes the bottom bar away until the returned function is called. */
  readonly coverBottomBar: () => () => void;
}

/** What a screen may ask of the frame around it. */
export const FrameContext = createContext<FrameShape>({ coverBottomBar: () => () => undefined });

/** True for the detail that stands beside its list: it needs no way back to it. */
export const BesideListContext = createContext(false);
