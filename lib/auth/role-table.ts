import type { Role, Scope } from './actor';

/**
 * Who may do what: the readable table that the server enforces, the buttons show and the tests walk.
 * `roles` count in the group of the record; `anyGroup` means a role in any group suffices, for what
 * all groups share; `admin` is the flag on the account; `scope` is a right of an access token.
 */
export type Rule = { roles: Role[]; anyGroup?: true; admin?: true; scope?: Scope };

export const roleTable = {
  'compound.write': { roles: ['pi'], anyGroup: true },
  'specification.write': { roles: ['pi'] },
  'run.write': { roles: ['chemist'] },
  'readings.write': { roles: ['chemist'], scope: 'readings:write' },
  'fraction.write': { roles: ['chemist'] },
  'fraction.submit': { roles: ['chemist'] },
  'fraction.return': { roles: ['analyst', 'pi'] },
  'fraction.signOff': { roles: ['analyst', 'pi'] },
  'fraction.reopen': { roles: ['analyst', 'pi'] },
  'evidence.write': { roles: ['chemist', 'analyst'], scope: 'evidence:write' },
  'plate.write': { roles: ['chemist', 'analyst'] },
  'trace.write': { roles: ['analyst'] },
  'refractiveIndex.write': { roles: ['chemist'], scope: 'readings:write' },
  'tray.file': { roles: ['analyst', 'chemist'] },
  'share.write': { roles: ['pi', 'analyst'] },
  'audit.read': { roles: ['pi'], admin: true },
  'administration.write': { roles: [], admin: true },
} as const satisfies Record<string, Rule>;

export type Action = keyof typeof roleTable;
