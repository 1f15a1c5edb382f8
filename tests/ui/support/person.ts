import type { OwnPerson } from '@/shared/api/account';

/** A person with an account, as the server tells it. */
export const buildPerson = (over: Partial<OwnPerson> = {}): OwnPerson => ({
  id: '0b6d3a52-6c1e-4c55-9d3a-1d2f3a4b5c6d',
  name: 'Marit Osei',
  email: 'marit@bench.example',
  role: 'technician',
  createdAt: '2025-03-04T10:00:00.000Z',
  ...over,
});
