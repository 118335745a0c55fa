import { queryOptions } from '@tanstack/react-query';
import { listYieldOutput } from '../contracts/yield';
import { apiGet } from './api';

export const yieldQuery = (query: Readonly<Record<string, string>>) =>
  queryOptions({
    queryKey: ['yield', query],
    queryFn: () => apiGet('/api/yield', listYieldOutput, query),
  });
