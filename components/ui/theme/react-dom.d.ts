declare module 'react-dom' {
  /** Draws what the work changes before it returns. */
  export function flushSync(work: () => void): void;
}
