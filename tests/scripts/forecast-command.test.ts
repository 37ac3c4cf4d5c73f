import { forecastCommand } from '@/server/engine/commands/forecast-command';
import { makeForecast } from '@/journal/forecast/make-forecast';
import { usOptionsCalendar } from '@/journal/sessions/us-options-calendar';
import { longCall } from '@/tests/journal/forecast/plan-examples';

describe('the forecast command', () => {
  it('gives the forecast the product shows, and its known mean', () => {
    const answer = forecastCommand(longCall);
    expect(answer).toEqual(makeForecast(longCall, usOptionsCalendar));
    expect(answer).toMatchObject({ atExpiry: { mean: { base: expect.closeTo(-13.13, 2) } } }); // computed outside this project with Python
  });

  it('refuses a plan with a key it does not know', () => {
    expect(() => forecastCommand({ ...longCall, hint: 1 })).toThrow('hint');
  });
});
