'use client';

import { usePathname, useRouter, useSearchParams } from 'next/navigation';
import { FillInChoice } from '@/components/ui/fill-in';
import type { Choice } from '@/components/ui/select-field';

interface AddressChoiceProps {
  /** Name of the query part. */
  name: string;
  label: string;
  choices: readonly Choice[];
  /** The first choice is what is shown when the address says nothing. */
  value: string;
}

/** A gap in a toolbar's sentence that is part of the address, so that Back undoes it. Begins with the first page again. */
export function AddressChoice({ name, label, choices, value }: AddressChoiceProps) {
  const router = useRouter();
  const path = usePathname();
  const query = useSearchParams();
  return (
    <FillInChoice
      label={label}
      choices={choices}
      value={value}
      onChange={(event) => {
        const next = new URLSearchParams(query);
        if (event.target.value === choices[0]?.value) next.delete(name);
        else next.set(name, event.target.value);
        next.delete('page');
        router.push(next.size > 0 ? `${path}?${next}` : path);
      }}
    />
  );
}
