import type { Role } from '@/lib/services/actor';

export const roleWords: Record<Role, string> = {
  engineer: 'engineer',
  checker: 'checker',
  'engineer-of-record': 'engineer of record',
  administrator: 'administrator',
};
