import { structureName } from '@/journal/contracts/structure-name';
import { type PlannedLeg } from '@/journal/contracts/planned-leg';

type Short = readonly [side: PlannedLeg['side'], type: PlannedLeg['type'], strikePrice: string, quantity?: number];
const legs = (...short: readonly Short[]): PlannedLeg[] =>
  short.map(([side, type, strikePrice, quantity = 1], index) => ({
    id: String(index),
    side,
    type,
    strikePrice,
    quantity,
    expirySessionDate: '2026-12-23',
    premium: '1',
  }));

describe('structureName', () => {
  it.each<[string, PlannedLeg[]]>([
    ['no legs yet', []],
    ['long 102 call', legs(['buy', 'call', '102'])],
    ['long 5 × 102.5 call', legs(['buy', 'call', '102.50', 5])],
    ['short 97 put', legs(['sell', 'put', '97'])],
    ['bull put 97 / 95', legs(['sell', 'put', '97'], ['buy', 'put', '95'])],
    ['bear put 97 / 95', legs(['buy', 'put', '97'], ['sell', 'put', '95'])],
    ['3 × bull call 100 / 105', legs(['buy', 'call', '100', 3], ['sell', 'call', '105', 3])],
    ['bear call 100 / 105', legs(['sell', 'call', '100'], ['buy', 'call', '105'])],
    ['long straddle 80', legs(['buy', 'call', '80'], ['buy', 'put', '80'])],
    ['short strangle 95 / 105', legs(['sell', 'call', '105'], ['sell', 'put', '95'])],
    ['risk reversal 95 / 105', legs(['sell', 'put', '95'], ['buy', 'call', '105'])],
    ['call ratio spread 100 / 105, 1 × 2', legs(['buy', 'call', '100'], ['sell', 'call', '105', 2])],
    ['call backspread 100 / 105, 1 × 2', legs(['sell', 'call', '100'], ['buy', 'call', '105', 2])],
    [
      'long call butterfly 95 / 100 / 105',
      legs(['buy', 'call', '95'], ['sell', 'call', '100', 2], ['buy', 'call', '105']),
    ],
    [
      'iron condor 3930 to 4070',
      legs(['sell', 'call', '4050'], ['buy', 'call', '4070'], ['sell', 'put', '3950'], ['buy', 'put', '3930']),
    ],
    [
      'iron butterfly 95 / 100 / 105',
      legs(['sell', 'call', '100'], ['buy', 'call', '105'], ['sell', 'put', '100'], ['buy', 'put', '95']),
    ],
    ['2 legs', legs(['buy', 'call', '100'], ['buy', 'call', '105'])],
    ['3 legs', legs(['buy', 'call', '95'], ['sell', 'call', '100', 2], ['buy', 'call', '120'])],
  ])('says “%s”', (name, structure) => {
    expect(structureName(structure)).toBe(name);
  });
});
