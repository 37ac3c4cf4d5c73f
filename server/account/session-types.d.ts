import 'express-session';

declare module 'express-session' {
  interface SessionData {
    passport?: { user: { personId: string; epoch: number } };
    /** The desk chosen among several; checked against the memberships on each request. */
    deskId?: string;
  }
}
