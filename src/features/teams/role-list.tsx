import { ROLE_MEANING, ROLES } from '#shared/access';

/** What each role may do. */
export const RoleList = () => (
  <dl className="text-sm">
    {ROLES.map((role) => (
      <div
        key={role}
        className="grid grid-cols-[5.5rem_1fr] gap-2 border-t border-dashed border-line py-1.5 first:border-0"
      >
        <dt className="font-bold">{role}</dt>
        <dd className="text-soft">{ROLE_MEANING[role]}</dd>
      </div>
    ))}
  </dl>
);
