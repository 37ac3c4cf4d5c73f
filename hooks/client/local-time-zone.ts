/** The IANA zone the browser is set to. */
export const localTimeZone = (): string => new Intl.DateTimeFormat().resolvedOptions().timeZone;
