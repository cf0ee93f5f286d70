'use client';

import { signOut } from 'next-auth/react';
import { useState } from 'react';

/** Ends the session here and on the server. */
export function SignOutButton() {
  const [leaving, setLeaving] = useState(false);
  return (
    <button
      type="button"
      className="min-h-9 hover:text-accent max-sm:min-h-[46px]"
      onClick={() => {
        setLeaving(true);
        void signOut({ redirect: false }).finally(() => window.location.replace('/sign-in'));
      }}
    >
      {leaving ? 'Signing out' : 'Sign out'}
    </button>
  );
}
