import { roles as allRoles, type Role } from '@tiltwright/shared/schemas/account.ts';
import { roleTasks } from '../../lib/role-words.ts';

interface RoleBoxesProps {
  value: readonly Role[];
  onChange: (roles: Role[]) => void;
  error?: string | undefined;
}

/** Which roles someone has, each with what it is for. */
export function RoleBoxes({ value, onChange, error }: RoleBoxesProps) {
  return (
    <fieldset className="flex min-w-0 flex-col">
      <legend className="float-left mb-1 w-full font-firm">Roles</legend>
      {allRoles.map((role) => (
        <label key={role} className="flex min-h-11 items-start gap-3 py-2">
          <input
            type="checkbox"
            className="mt-0.5 size-5 flex-none accent-ink"
            checked={value.includes(role)}
            onChange={(event) => onChange(allRoles.filter((one) => (one === role ? event.target.checked : value.includes(one))))}
          />
          <span>
            {role}
            <span className="block text-note text-ink-2">{roleTasks[role]}</span>
          </span>
        </label>
      ))}
      {error && <p className="border-l-[3px] border-rust pl-2 text-note text-rust">{error}</p>}
    </fieldset>
  );
}
