import { z } from 'zod';

/** What a person may do on a desk; held per desk on the membership. */
export const roles = ['trader', 'mentor', 'lead'] as const;
export const roleSchema = z.enum(roles);
export type Role = z.infer<typeof roleSchema>;

/** Roles that keep a journal of their own. */
export const journalRoles: readonly Role[] = ['trader', 'lead'];
