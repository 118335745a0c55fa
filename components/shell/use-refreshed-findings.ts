'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useState } from 'react';
import { ApiFailure } from '@/lib/queries/api';
import { refreshFindings } from '@/lib/queries/statements';

/**
 * Has findings kept as the facts of today make them, once per visit where `stale` says so.
 * Answers whether it did. A lost connection is no matter: the next visit asks again.
 */
export function useRefreshedFindings(stale: boolean, statementId?: string): boolean {
  const queries = useQueryClient();
  const [refreshed, setRefreshed] = useState(false);
  useEffect(() => {
    if (!stale || refreshed) return;
    let gone = false;
    refreshFindings(queries, statementId)
      .then(() => {
        if (!gone) setRefreshed(true);
      })
      .catch((error: unknown) => {
        if (!(error instanceof ApiFailure)) throw error;
      });
    return () => {
      gone = true;
    };
  }, [stale, refreshed, queries, statementId]);
  return refreshed;
}
