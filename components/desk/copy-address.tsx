'use client';

import { useToast } from '@/components/ui/toast';

/** Puts the address of what is shown on the clipboard. */
export function CopyAddress() {
  const toast = useToast();
  return (
    <button
      type="button"
      className="sw-link text-cap"
      onClick={() =>
        void navigator.clipboard.writeText(window.location.href).then(
          () => toast('Address copied'),
          () => toast('The browser did not allow copying. Take it from the address line.'),
        )
      }
    >
      Copy the address
    </button>
  );
}
