import { z } from 'zod';
import { page, pageQuery } from './page';
import { words } from '@/shared/layout/primitives';
import { roleSchema } from '@/shared/roles';

/** A person as moderators see him in the list of people. */
export const personRow = z.strictObject({
  id: z.uuid(),
  name: z.string(),
  email: z.string(),
  role: roleSchema,
  confirmed: z.boolean().describe('True once the e-mail address was confirmed.'),
  createdAt: z.iso.datetime(),
  version: z.number().int().min(1).describe('For If-Match when the person is changed.'),
});
export type PersonRow = z.output<typeof personRow>;

/** Query of GET /people. */
export const peopleQuery = pageQuery.extend({
  search: z.string().trim().max(80).optional().describe('Part of the name or of the address.'),
  role: roleSchema.optional(),
});
export type PeopleQuery = z.output<typeof peopleQuery>;

export const peoplePage = page(personRow);
export type PeoplePage = z.output<typeof peoplePage>;

/** PATCH /people/:id, with If-Match: "<version>". */
export const personChange = z.strictObject({ role: roleSchema });
export type PersonChange = z.output<typeof personChange>;

/** POST /role-requests: asks for the role of contributor. */
export const roleRequestInput = z.strictObject({ reason: words(1000) });
export type RoleRequestInput = z.output<typeof roleRequestInput>;

/** A request for the role of contributor. */
export const roleRequestRow = z.strictObject({
  id: z.uuid(),
  person: z.strictObject({ id: z.uuid(), name: z.string(), role: roleSchema }),
  reason: z.string(),
  state: z.enum(['open', 'granted', 'declined']),
  createdAt: z.iso.datetime(),
  decidedAt: z.iso.datetime().nullable(),
});
export type RoleRequestRow = z.output<typeof roleRequestRow>;

/** Answer of GET /me/role-request. */
export const ownRoleRequest = z.strictObject({ request: roleRequestRow.nullable() });
export type OwnRoleRequest = z.output<typeof ownRoleRequest>;

/** Query of GET /role-requests. */
export const roleRequestQuery = pageQuery.extend({ state: z.enum(['open', 'granted', 'declined']).default('open') });
export type RoleRequestQuery = z.output<typeof roleRequestQuery>;

export const roleRequestPage = page(roleRequestRow);
export type RoleRequestPage = z.output<typeof roleRequestPage>;

/** PATCH /role-requests/:id */
export const roleDecision = z.strictObject({ decision: z.enum(['granted', 'declined']) });
export type RoleDecision = z.output<typeof roleDecision>;
