import { queryOptions } from '@tanstack/react-query';
import { listActivityOutput } from '../contracts/activity';
import { listKeysOutput } from '../contracts/keys';
import { listOutboxOutput, mailMessage } from '../contracts/outbox';
import { listPeopleOutput } from '../contracts/people';
import { apiGet } from './api';

type Query = Readonly<Record<string, string>>;

export const peopleQuery = () =>
  queryOptions({ queryKey: ['people'], queryFn: () => apiGet('/api/people', listPeopleOutput) });

export const keysQuery = () =>
  queryOptions({ queryKey: ['keys'], queryFn: () => apiGet('/api/keys', listKeysOutput) });

export const outboxQuery = (query: Query) =>
  queryOptions({
    queryKey: ['outbox', query],
    queryFn: () => apiGet('/api/outbox', listOutboxOutput, query),
  });

export const mailQuery = (mailId: string) =>
  queryOptions({
    queryKey: ['outbox', 'message', mailId],
    queryFn: () => apiGet(`/api/outbox/${mailId}`, mailMessage),
  });

export const activityQuery = (query: Query) =>
  queryOptions({
    queryKey: ['activity', query],
    queryFn: () => apiGet('/api/activity', listActivityOutput, query),
  });
