import { VerdictMark } from '@/components/ui/verdict-mark';

/** What the marks of the lot rule mean. */
export function LotRuleKey() {
  return (
    <span className="flex flex-wrap gap-5 text-cap text-ink-2">
      <span className="inline-flex items-center gap-1.5">
        <VerdictMark shape="reject" size={12} /> rejected
      </span>
      <span className="inline-flex items-center gap-1.5">
        <svg viewBox="0 0 10 16" width={10} height={16} aria-hidden="true">
          <path d="M5 16V8" stroke="var(--sw-ink)" strokeWidth={2} />
          <circle cx={5} cy={5} r={3.4} fill="var(--sw-paper)" stroke="var(--sw-ink)" strokeWidth={2} />
        </svg>{' '}
        passed on a later attempt
      </span>
      <span className="inline-flex items-center gap-1.5">
        <svg viewBox="0 0 10 16" width={10} height={16} aria-hidden="true">
          <path d="M5 16v-5m0-4v-6" stroke="var(--sw-ink-2)" strokeWidth={2} />
        </svg>{' '}
        no verdict
      </span>
    </span>
  );
}
