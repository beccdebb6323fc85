import type { ReactElement } from 'react';
import { ROLE_WORDS, type RoleName } from '@/components/shell/role-words';
import { Select } from '@/components/ui/select';
import { sentence } from '@/components/ui/sentence';
import type { FieldControl } from '@/components/ui/field';

/** What each role does, in a line. */
const ROLE_LINES: Readonly<Record<RoleName, string>> = {
  technician: 'reads combs at the nest, with a phone',
  reviewer: 'reads a second time, settles, locks',
  biologist: 'a reviewer who also owns the settings',
  coordinator: 'people, hosts, phones, downloads',
  researcher: 'downloads, with places rounded',
};

const ROLES = Object.keys(ROLE_WORDS) as RoleName[];

interface RoleSelectProps {
  control: FieldControl;
  value: RoleName;
  onChoose: (role: RoleName) => void;
}

/** The five roles with what each does. */
export function RoleSelect({ control, value, onChoose }: RoleSelectProps): ReactElement {
  return (
    <Select
      {...control}
      value={value}
      onChange={(event) => {
        const chosen = ROLES.find((role) => role === event.target.value);
        if (chosen) onChoose(chosen);
      }}
    >
      {ROLES.map((role) => (
        <option key={role} value={role}>
          {sentence(ROLE_WORDS[role])}: {ROLE_LINES[role]}
        </option>
      ))}
    </Select>
  );
}
