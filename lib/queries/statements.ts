import type { QueryClient } from '@tanstack/react-query';
import { queryOptions } from '@tanstack/react-query';
import { importPreview } from '../contracts/imports';
import { candidatesOutput, refreshOutput, sheet } from '../contracts/sheet';
import { listStatementsOutput } from '../contracts/statements';
import { listVariancesOutput } from '../contracts/variances';
import { apiGet, apiSend } from './api';

type Query = Readonly<Record<string, string>>;

export const statementsQuery = (query: Query) =>
  queryOptions({
    queryKey: ['statements', 'list', query],
    queryFn: () => apiGet('/api/statements', listStatementsOutput, query),
  });

export const sheetQuery = (statementId: string) =>
  queryOptions({
    queryKey: ['statements', 'sheet', statementId],
    queryFn: () => apiGet(`/api/statements/${statementId}/sheet`, sheet),
  });

export const candidatesQuery = (statementId: string, billLineId: string, search: string) =>
  queryOptions({
    queryKey: ['statements', 'candidates', statementId, billLineId, search],
    queryFn: () =>
      apiGet(`/api/statements/${statementId}/lines/${billLineId}/candidates`, candidatesOutput, {
        search,
      }),
  });

export const importPreviewQuery = (importId: string) =>
  queryOptions({
    queryKey: ['imports', 'one', importId],
    queryFn: () => apiGet(`/api/imports/${importId}`, importPreview),
  });

export const variancesQuery = (query: Query) =>
  queryOptions({
    queryKey: ['variances', query],
    queryFn: () => apiGet('/api/variances', listVariancesOutput, query),
  });

/** Has findings kept as today's facts make them: one statement's, or those of all open ones. */
export async function refreshFindings(queries: QueryClient, statementId?: string): Promise<void> {
  const body = statementId ? { statementId } : {};
  const { changed } = await apiSend('POST', '/api/statements/refresh', body, refreshOutput);
  if (!changed) return;
  await queries.invalidateQueries({ queryKey: ['statements'] });
  await queries.invalidateQueries({ queryKey: ['variances'] });
}
