'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { z } from 'zod';
import { ApiFailure, apiSend } from '@/lib/queries/api';
import { routes } from '@/lib/routes';
import { useCommon } from '../ui/locale';

/** Ends the session, forgets what was read, and goes to sign-in. */
export function SignOutButton({ className }: { className?: string }) {
  const words = useCommon();
  const queries = useQueryClient();
  const [problem, setProblem] = useState<string | null>(null);
  async function signOut() {
    try {
      await apiSend('POST', '/api/sign-out', {}, z.unknown());
    } catch (error) {
      if (!(error instanceof ApiFailure)) throw error;
      if (error.code !== 'notSignedIn') {
        setProblem(error.message);
        return;
      }
    }
    queries.clear();
    // A full load, so that nothing of the last person's screens stays in the router's memory.
    window.location.assign(routes.signIn());
  }
  return (
    <>
      <button type="button" onClick={signOut} className={className}>
        {words.signOut}
      </button>
      {problem && (
        <p role="alert" className="px-4 pb-2 text-sm text-keel">
          {problem}
        </p>
      )}
    </>
  );
}
