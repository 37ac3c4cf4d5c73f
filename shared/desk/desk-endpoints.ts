import { z } from 'zod';
import { defineEndpoint } from '@/shared/contract/define-endpoint';
import { idSchema } from '@/shared/contract/fields';
import { noInput } from '@/shared/contract/no-input';
import { roles, roleSchema } from '@/shared/contract/roles';
import { deskSettingsFields, deskSettingsSchema } from '@/shared/desk/desk-settings';

const deskSchema = z.strictObject({
  settings: deskSettingsSchema,
  members: z.array(z.strictObject({ personId: idSchema, displayName: z.string(), role: roleSchema })),
});
export type Desk = z.infer<typeof deskSchema>;

export const deskEndpoints = {
  readDesk: defineEndpoint({
    name: 'readDesk',
    method: 'GET',
    path: '/desk',
    summary: 'Settings and members of the active desk',
    access: { kind: 'desk', roles, rows: 'desk' },
    params: noInput,
    query: noInput,
    body: null,
    needsVersion: false,
    status: 200,
    response: deskSchema,
  }),
  editDeskSettings: defineEndpoint({
    name: 'editDeskSettings',
    method: 'PATCH',
    path: '/desk/settings',
    summary: 'Change what the desk presets for every plan',
    access: { kind: 'desk', roles: ['lead'], rows: 'desk' },
    params: noInput,
    query: noInput,
    body: z.strictObject(deskSettingsFields),
    needsVersion: true,
    status: 200,
    response: deskSchema,
  }),
};
