/** Whether this run is the long one: `BRIERBOOK_TEST_DEEP=yes npm test`. */
const isDeep = process.env.BRIERBOOK_TEST_DEEP === 'yes';

/** How many times a test does its work: few in every run, many in the long one. */
export const runs = (short: number, deep: number): number => (isDeep ? deep : short);
