import { Section } from '@/components/ui/page-head';
import { roles } from '@/lib/access/roles';
import { roleWords } from '@/lib/access/role-words';

/** What the roles may do, beside the list of people. */
export function RolesTable() {
  return (
    <Section title="What the roles may do">
      <dl className="text-cap">
        {roles.map((role) => (
          <div key={role} className="grid grid-cols-[110px_1fr] gap-3 border-b border-hair py-2">
            <dt className="font-bold">{roleWords[role].name}</dt>
            <dd>{roleWords[role].may}</dd>
          </div>
        ))}
      </dl>
      <p className="mt-2 text-cap text-ink-2">
        Nobody approves what they made, whatever roles they hold. Role changes need a reason and stand in the trail.
      </p>
    </Section>
  );
}
