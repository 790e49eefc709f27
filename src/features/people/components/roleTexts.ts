import { roles } from '../../../../shared/account.ts';
import type { Role } from '../../../../shared/account.ts';

export const roleOptions: readonly { value: Role; label: string }[] = roles.map((role) => ({
  value: role,
  label: role.charAt(0).toUpperCase() + role.slice(1),
}));
