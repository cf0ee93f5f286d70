import { Toolbar } from '@/components/ui/page-head';
import type { ComparisonPage, ComparisonView } from '@/lib/contracts/sequence-pages';
import type { SequenceComparison } from '@/lib/sequence/compare-sequences';
import { AddressChoice } from '../address-choice';
import { CopyAddress } from '../copy-address';

interface ComparisonToolbarProps {
  page: ComparisonPage;
  view: ComparisonView;
  comparison: SequenceComparison;
}

/** "Show r6 against r7 with every step." */
export function ComparisonToolbar({ page, view, comparison }: ComparisonToolbarProps) {
  const { heads, a, b, usual } = page;
  // What the address says when it says nothing stands first.
  const choices = (first: number) =>
    [first, ...heads.map(({ number }) => number).filter((number) => number !== first)].map((number) => ({
      value: `r${number}`,
      label: `r${number}`,
    }));
  const { stepsChanged, valuesChanged, steps } = comparison;
  return (
    <Toolbar
      count={
        <span className="flex flex-wrap items-center gap-x-4 gap-y-1">
          <span>
            <b>{stepsChanged}</b> of {steps.length} steps changed, <b>{valuesChanged}</b>{' '}
            {valuesChanged === 1 ? 'value' : 'values'}
          </span>
          <CopyAddress />
        </span>
      }
    >
      Show <AddressChoice name="a" label="Earlier revision" choices={choices(usual.a)} value={`r${a.head.number}`} />{' '}
      against <AddressChoice name="b" label="Later revision" choices={choices(usual.b)} value={`r${b.head.number}`} />{' '}
      with{' '}
      <AddressChoice
        name="steps"
        label="Steps"
        choices={[
          { value: 'all', label: 'every step' },
          { value: 'changed', label: 'changed steps' },
        ]}
        value={view.steps}
      />
    </Toolbar>
  );
}
