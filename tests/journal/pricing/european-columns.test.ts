import fc from 'fast-check';
import {
  europeanPriceColumns,
  europeanValueColumns,
  optionColumns,
  valueColumns,
} from '@/journal/pricing/european-columns';
import { europeanOptionPrice, europeanOptionValue } from '@/journal/pricing/european-option';
import { columnsOf } from '@/tests/bench/column-options';
import { plannedCall } from '@/tests/journal/pricing/planned-call';
import { randomOption } from '@/tests/journal/pricing/random-option';

fc.configureGlobal({ seed: 20261201 });

/** More than one chunk of rows and a part of another. */
const options = fc.sample(randomOption, 300);

describe('European options in columns', () => {
  it('have price, Greeks and odds of the same options one by one, to the last digit', () => {
    const values = valueColumns(options.length);
    europeanValueColumns(columnsOf(options), values, 1 / 365);
    for (const [row, option] of options.entries()) {
      const figures = Object.fromEntries(Object.entries(values).map(([name, column]) => [name, column[row]]));
      expect(figures).toEqual(europeanOptionValue(option));
    }
  });

  it('have the same prices alone', () => {
    const price = new Float64Array(options.length);
    europeanPriceColumns(columnsOf(options), price);
    expect(Array.from(price)).toEqual(options.map(europeanOptionPrice));
  });

  it('do nothing where there are none', () => {
    expect(() => europeanValueColumns(optionColumns(0), valueColumns(0), 1 / 365)).not.toThrow();
  });

  it('throws option-input-invalid naming row, field and value of the first that is invalid', () => {
    const columns = columnsOf([
      ...options.slice(0, 200),
      { ...plannedCall, sessions: -1 },
      { ...plannedCall, sessions: NaN },
    ]);
    const refusal = expect.objectContaining({
      code: 'option-input-invalid',
      details: { row: 200, field: 'sessions', value: -1 },
    });
    expect(() => europeanPriceColumns(columns, new Float64Array(202))).toThrow(refusal);
    expect(() => europeanValueColumns(columns, valueColumns(202), 1 / 365)).toThrow(refusal);
  });

  it('throws option-input-invalid for a direction that is neither call nor put', () => {
    const columns = columnsOf([plannedCall]);
    columns.direction[0] = 0;
    expect(() => europeanPriceColumns(columns, new Float64Array(1))).toThrow(
      expect.objectContaining({ code: 'option-input-invalid', details: { field: 'direction', value: 0 } }),
    );
  });

  it.each([-1, NaN, Infinity])('throws option-input-invalid for %p years to the next session', (years) => {
    expect(() => europeanValueColumns(columnsOf([plannedCall]), valueColumns(1), years)).toThrow(
      expect.objectContaining({
        code: 'option-input-invalid',
        details: { field: 'yearsPerNextSession', value: years },
      }),
    );
  });

  it('throws option-value-out-of-range where interest takes the strike out of the doubles', () => {
    const columns = columnsOf([plannedCall, { ...plannedCall, type: 'put', years: 100, ratePerYear: -10 }]);
    const refusal = expect.objectContaining({ code: 'option-value-out-of-range', details: { row: 1 } });
    expect(() => europeanPriceColumns(columns, new Float64Array(2))).toThrow(refusal);
    expect(() => europeanValueColumns(columns, valueColumns(2), 1 / 365)).toThrow(refusal);
  });

  it('prices huge numbers whose sum leaves the doubles, though they do not', () => {
    const price = new Float64Array(1);
    europeanPriceColumns(
      columnsOf([{ ...plannedCall, spotPrice: 1.2e308, strikePrice: 1e308, years: 0, sessions: 0 }]),
      price,
    );
    expect(price[0]).toBe(1.2e308 - 1e308);
  });
});
