import type { UseFormRegisterReturn } from 'react-hook-form';
import { SelectField } from '@/components/ui/select-field';
import { TextAreaField } from '@/components/ui/text-area-field';
import type { ReasonChoice } from '@/lib/contracts/reason-code';
import type { ReasonCodeUse } from '@/lib/contracts/stored-states';

interface ReasonFieldsProps {
  use: ReasonCodeUse;
  reasons: readonly ReasonChoice[];
  code: UseFormRegisterReturn;
  words: UseFormRegisterReturn;
  codeError: string | undefined;
  wordsError: string | undefined;
}

/** One of the reasons that quality keeps, free words, or both; only words where none is kept. */
export function ReasonFields({ use, reasons, code, words, codeError, wordsError }: ReasonFieldsProps) {
  const kept = reasons.filter((reason) => reason.use === use);
  if (kept.length === 0) return <TextAreaField {...words} label="Reason" rows={2} error={wordsError ?? codeError} />;
  return (
    <>
      <SelectField
        key={use}
        {...code}
        label="Reason"
        choices={[{ value: '', label: 'in words, below' }, ...kept.map(({ id, word }) => ({ value: id, label: word }))]}
        error={codeError}
      />
      <TextAreaField {...words} label="In words" rows={2} error={wordsError} />
    </>
  );
}
