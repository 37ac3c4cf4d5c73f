import { QueryClientProvider } from '@tanstack/react-query';
import { act, render } from '@testing-library/react';
import { type ReactElement } from 'react';
import { ToastProvider } from '@/components/ui/toast';
import { createQueryClient } from '@/hooks/client/query-client';

// The browser of the tests lacks it; drafts are plain data, so text and back is the same.
global.structuredClone ??= <T,>(value: T): T => JSON.parse(JSON.stringify(value));

/** What the server would answer, by "GET /today"; without a status it is a success. */
export type Answers = Readonly<Record<string, unknown>>;

/** Renders with the real hooks over made answers, and gives the calls that were made. */
export function renderScreen(screen: ReactElement, answers: Answers = {}): { calls: string[] } {
  const calls: string[] = [];
  global.fetch = jest.fn(async (input: RequestInfo | URL, init?: RequestInit) => {
    const path = String(input).replace('/api/v1', '').split('?')[0] ?? '';
    const call = `${init?.method ?? 'GET'} ${path}`;
    calls.push(call);
    const json = answers[call];
    const isKnown = call in answers;
    return {
      ok: isKnown,
      status: isKnown ? 200 : 404,
      json: async () =>
        isKnown
          ? json
          : {
              error: {
                code: 'not-found',
                message: 'There is no such thing.',
                action: '',
                problems: [],
                requestId: 'r',
              },
            },
    } as Response; // the client reads these three only
  });
  render(
    <QueryClientProvider client={createQueryClient()}>
      <ToastProvider>{screen}</ToastProvider>
    </QueryClientProvider>,
  );
  return { calls };
}

/** The width of the browser's window, in points. */
export function setWidth(width: number): void {
  Object.defineProperty(document.documentElement, 'clientWidth', { configurable: true, value: width });
  act(() => void window.dispatchEvent(new Event('resize')));
}
