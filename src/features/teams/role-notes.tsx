import { ROLES, type Role } from '#shared/access/roles';

const MAY: Record<Role, string> = {
  viewer: 'Opens sheets and sees them live.',
  reviewer: 'A viewer who also writes in threads and signs off.',
  designer: 'A reviewer who also draws, and asks for review.',
  owner: 'A designer who also invites people and archives sheets.',
};

/** What one may do oneself. */
export function OwnRole({ role }: { readonly role: Role }) {
  return (
    <section>
      <h2 className="text-xs text-faint">Your role here</h2>
      <p className="mt-2 font-bold">{role}</p>
      <p>{MAY[role]}</p>
    </section>
  );
}

/** What each role may do. */
export function RoleNotes() {
  return (
    <section>
      <h2 className="text-xs text-faint">Roles</h2>
      <dl className="mt-2 flex flex-col gap-3">
        {ROLES.map((role) => (
          <div key={role}>
            <dt className="font-bold">{role}</dt>
            <dd>{MAY[role]}</dd>
          </div>
        ))}
      </dl>
    </section>
  );
}
