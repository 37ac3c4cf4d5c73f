// Loaded before the server: its clock runs on from TEST_CLOCK_STARTS_AT, so that no test depends on the day it runs.
const RealDate = Date;
const offsetMs = RealDate.parse(process.env.TEST_CLOCK_STARTS_AT ?? '') - RealDate.now();
if (Number.isNaN(offsetMs)) throw new Error('TEST_CLOCK_STARTS_AT is not an instant.');

globalThis.Date = class extends RealDate {
  constructor(...parts) {
    super(...(parts.length === 0 ? [RealDate.now() + offsetMs] : parts));
  }
  static now() {
    return RealDate.now() + offsetMs;
  }
};
