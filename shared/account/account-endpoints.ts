import { z } from 'zod';
import { defineEndpoint } from '@/shared/contract/define-endpoint';
import { idSchema, shortTextSchema } from '@/shared/contract/fields';
import { noInput } from '@/shared/contract/no-input';
import { roleSchema } from '@/shared/contract/roles';
import { emailSchema, newPasswordSchema, presentedPasswordSchema, timeZoneSchema } from '@/shared/account/credentials';
import { deskSettingsSchema } from '@/shared/desk/desk-settings';

export const meSchema = z.strictObject({
  person: z.strictObject({
    id: idSchema,
    email: z.string(),
    displayName: z.string(),
    timeZone: z.string(),
  }),
  /** The desk all other calls work on. */
  desk: z.strictObject({ id: idSchema, role: roleSchema, settings: deskSettingsSchema }),
  desks: z.array(z.strictObject({ id: idSchema, name: z.string(), role: roleSchema })),
  /** The server's clock, so that a page can say what "today" is. */
  serverTime: z.iso.datetime({ precision: 3 }),
});
export type Me = z.infer<typeof meSchema>;

const signUpBody = z.strictObject({
  email: emailSchema,
  password: newPasswordSchema,
  displayName: shortTextSchema,
  timeZone: timeZoneSchema,
});

export const accountEndpoints = {
  signUp: defineEndpoint({
    name: 'signUp',
    method: 'POST',
    path: '/account/sign-up',
    summary: 'Make an account with a desk of one, and sign in',
    access: { kind: 'public' },
    params: noInput,
    query: noInput,
    body: signUpBody,
    needsVersion: false,
    status: 201,
    response: meSchema,
  }),
  acceptInvitation: defineEndpoint({
    name: 'acceptInvitation',
    method: 'POST',
    path: '/account/accept-invitation',
    summary: 'Make the first lead of a fresh installation from a one-time invitation, and sign in',
    access: { kind: 'public' },
    params: noInput,
    query: noInput,
    body: signUpBody.extend({ token: z.string().min(20).max(200), deskName: shortTextSchema }),
    needsVersion: false,
    status: 201,
    response: meSchema,
  }),
  signIn: defineEndpoint({
    name: 'signIn',
    method: 'POST',
    path: '/account/sign-in',
    summary: 'Sign in with e-mail and password',
    access: { kind: 'public' },
    params: noInput,
    query: noInput,
    body: z.strictObject({ email: z.string().min(1).max(254), password: presentedPasswordSchema }),
    needsVersion: false,
    status: 200,
    response: meSchema,
  }),
  signOut: defineEndpoint({
    name: 'signOut',
    method: 'POST',
    path: '/account/sign-out',
    summary: 'End this session',
    access: { kind: 'signedIn' },
    params: noInput,
    query: noInput,
    body: null,
    needsVersion: false,
    status: 204,
    response: null,
  }),
  readMe: defineEndpoint({
    name: 'readMe',
    method: 'GET',
    path: '/account/me',
    summary: 'Who is signed in, on which desk, in which role',
    access: { kind: 'signedIn' },
    params: noInput,
    query: noInput,
    body: null,
    needsVersion: false,
    status: 200,
    response: meSchema,
  }),
  switchDesk: defineEndpoint({
    name: 'switchDesk',
    method: 'POST',
    path: '/account/active-desk',
    summary: 'Work on another desk of one’s own',
    access: { kind: 'signedIn' },
    params: noInput,
    query: noInput,
    body: z.strictObject({ deskId: idSchema }),
    needsVersion: false,
    status: 200,
    response: meSchema,
  }),
  editProfile: defineEndpoint({
    name: 'editProfile',
    method: 'PATCH',
    path: '/account/profile',
    summary: 'Change one’s own display name or time zone',
    access: { kind: 'signedIn' },
    params: noInput,
    query: noInput,
    body: z.strictObject({ displayName: shortTextSchema, timeZone: timeZoneSchema }),
    needsVersion: false,
    status: 200,
    response: meSchema,
  }),
};
