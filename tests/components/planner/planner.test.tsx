import { fireEvent, screen, waitFor, within } from '@testing-library/react';
import type * as FakeRouter from '@/tests/components/support/fake-router';
import { PlannerScreen } from '@/components/planner/planner-screen';
import { visited } from '@/tests/components/support/fake-router';
import { renderScreen, setWidth } from '@/tests/components/support/render-screen';
import { ids, sampleDetail, sampleDraft, sampleLeg, sampleMe } from '@/tests/components/support/sample-journal';
import { type DraftLeg } from '@/shared/entries/draft-plan';

jest.mock('expo-router', () => jest.requireActual<typeof FakeRouter>('@/tests/components/support/fake-router'));

const press = (name: string) => fireEvent.click(screen.getByRole('button', { name }));

async function open(legs: DraftLeg[]) {
  const { calls } = renderScreen(<PlannerScreen entryId={ids.entry} />, {
    [`GET /entries/${ids.entry}`]: sampleDraft(legs),
    [`GET /underlyings/${ids.underlying}`]: sampleDetail,
    [`DELETE /entries/${ids.entry}`]: null,
    'GET /account/me': sampleMe,
  });
  await screen.findByRole('heading', { level: 1, name: /^Plan: ZZIX/ });
  return calls;
}

describe('the planner on a phone', () => {
  beforeEach(() => setWidth(390));

  it('names what a leg lacks only after the person went on from it', async () => {
    await open([sampleLeg({ strikePrice: '' })]);
    press('Next: structure');
    const strike = screen.getByRole('textbox', { name: 'Strike' });
    expect(strike.getAttribute('aria-invalid')).not.toBe('true');
    press('Next: odds');
    press('Back');
    expect(screen.getByRole('textbox', { name: 'Strike' }).getAttribute('aria-invalid')).toBe('true');
  });

  it('keeps a leg that is being completed open, and shows a complete one as a line', async () => {
    await open([sampleLeg(), sampleLeg({ id: ids.upload, side: 'sell', strikePrice: '103', premium: '' })]);
    press('Next: structure');
    expect(screen.getByText('Buy 3 × 23 Dec 101 call')).toBeTruthy();
    fireEvent.change(screen.getByRole('textbox', { name: 'Premium' }), { target: { value: '0.55' } });
    await screen.findByText(/^Profit at expiry/);
    expect(screen.getByRole('textbox', { name: 'Premium' })).toBeTruthy();
    press('Close leg 2');
    expect(screen.getByText('Sell 3 × 23 Dec 103 call')).toBeTruthy();
    press('Edit leg 1');
    expect((screen.getByRole('textbox', { name: 'Strike' }) as HTMLInputElement).value).toBe('101');
  });
});

describe('discarding a draft', () => {
  beforeEach(() => {
    setWidth(1440);
    visited.length = 0;
  });

  it('asks first, and nothing is removed when the answer is no', async () => {
    const calls = await open([sampleLeg()]);
    press('Discard draft');
    fireEvent.click(within(screen.getByRole('dialog')).getByRole('button', { name: 'Keep it' }));
    expect(screen.queryByRole('dialog')).toBeNull();
    expect(calls.filter((call) => call.startsWith('DELETE'))).toEqual([]);
    expect(visited).toEqual([]);
  });

  it('removes it and leads to the journal when the answer is yes', async () => {
    const calls = await open([sampleLeg()]);
    press('Discard draft');
    fireEvent.click(within(screen.getByRole('dialog')).getByRole('button', { name: 'Discard' }));
    await waitFor(() => expect(visited).toEqual(['/journal']));
    expect(calls).toContain(`DELETE /entries/${ids.entry}`);
  });
});
