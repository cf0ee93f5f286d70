import { decideAccess } from './access';
import type { Role } from './roles';
import { surface } from './surface';

export interface MenuItem {
  href: string;
  label: string;
}

/** The desk's main menu, in the order of the work. */
const menu: readonly MenuItem[] = [
  { href: '/lots', label: 'Lots' },
  { href: '/rejects', label: 'Rejects' },
  { href: '/units', label: 'Units' },
  { href: '/stations', label: 'Stations' },
  { href: '/board-types', label: 'Board types' },
  { href: '/sequences', label: 'Sequences' },
  { href: '/instruments', label: 'Instruments' },
  { href: '/trail', label: 'Trail' },
  { href: '/administration', label: 'Administration' },
];

/** The items whose page these roles open. */
export function menuFor(roles: readonly Role[]): MenuItem[] {
  return menu.filter(({ href }) => {
    const access = surface.pages[href];
    return access !== undefined && decideAccess(access, { roles, enrolledBench: false }) === 'allowed';
  });
}

/** Where these roles begin after signing in: the administrator with people, everyone else with the first of the menu. */
export function startPageFor(roles: readonly Role[]): string {
  const items = menuFor(roles);
  const onlyAdministrator = roles.length === 1 && roles[0] === 'administrator';
  return (onlyAdministrator ? items.at(-1) : items[0])?.href ?? '/not-allowed';
}
