import { useOrganization } from '../../lib/session-context';

/** The department the reader works for now, by its id and name; null for everybody else. */
export function useOwnDepartment(): { id: string; name: string } | null {
  const organization = useOrganization()?.organization;
  return organization?.kind === 'department' ? { id: organization.id, name: organization.name } : null;
}
