import { queryOptions } from '@tanstack/react-query';
import { listJobsOutput } from '../contracts/jobs';
import { listOrdersOutput } from '../contracts/orders';
import { apiGet } from './api';

type Query = Readonly<Record<string, string>>;

export const jobsQuery = (query: Query) =>
  queryOptions({
    queryKey: ['jobs', query],
    queryFn: () => apiGet('/api/jobs', listJobsOutput, query),
  });

export const ordersQuery = (query: Query) =>
  queryOptions({
    queryKey: ['orders', query],
    queryFn: () => apiGet('/api/orders', listOrdersOutput, query),
  });
