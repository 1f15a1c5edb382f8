import type { RoleRequest } from '@/server/models/role-request';
import type { User } from '@/server/models/user';
import type { RoleRequestRow } from '@/shared/api/people';

/** A request for the role of contributor, with whose it is. */
export const presentRoleRequest = (request: RoleRequest, person: User): RoleRequestRow => ({
  id: request.id,
  person: { id: person.id, name: person.name, role: person.role },
  reason: request.reason,
  state: request.state,
  createdAt: request.createdAt.toISOString(),
  decidedAt: request.decidedAt?.toISOString() ?? null,
});
