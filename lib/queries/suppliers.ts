import { queryOptions } from '@tanstack/react-query';
import { listSuppliersOutput } from '../contracts/suppliers';
import { apiGet } from './api';

export const suppliersQuery = (query: Readonly<Record<string, string>>) =>
  queryOptions({
    queryKey: ['suppliers', query],
    queryFn: () => apiGet('/api/suppliers', listSuppliersOutput, query),
  });
