import type { QueryClient } from '@tanstack/react-query';
import { queryOptions } from '@tanstack/react-query';
import { reading } from '../contracts/photos';
import { pourDay, pourDayPlacement } from '../contracts/pour-day';
import { listPumpTicketsOutput } from '../contracts/pump-tickets';
import { listTicketsOutput, ticketDetail } from '../contracts/tickets';
import { apiGet } from './api';

type Query = Readonly<Record<string, string>>;

/** How often a photo that is being read is asked about. */
const READING_POLL_MS = 1500;
/** How often a placement is looked at again while its trucks come. */
const PLACEMENT_POLL_MS = 15_000;

export const pourDayQuery = (day: string) =>
  queryOptions({
    queryKey: ['pour-day', day],
    queryFn: () => apiGet('/api/pour-day', pourDay, { day }),
    refetchInterval: PLACEMENT_POLL_MS,
  });

export const pourDayPlacementQuery = (placementId: string) =>
  queryOptions({
    queryKey: ['pour-day', 'placement', placementId],
    queryFn: () => apiGet(`/api/pour-day/${placementId}`, pourDayPlacement),
    refetchInterval: (query) =>
      query.state.data?.loads.some((load) => isBeingRead(load.reading?.state))
        ? READING_POLL_MS
        : PLACEMENT_POLL_MS,
  });

export const ticketQuery = (ticketId: string) =>
  queryOptions({
    queryKey: ['tickets', 'one', ticketId],
    queryFn: () => apiGet(`/api/tickets/${ticketId}`, ticketDetail),
  });

export const readingQuery = (photoId: string) =>
  queryOptions({
    queryKey: ['readings', photoId],
    queryFn: () => apiGet(`/api/photos/${photoId}/reading`, reading),
    refetchInterval: (query) => (isBeingRead(query.state.data?.state) ? READING_POLL_MS : false),
  });

export const ticketsQuery = (query: Query) =>
  queryOptions({
    queryKey: ['tickets', 'list', query],
    queryFn: () => apiGet('/api/tickets', listTicketsOutput, query),
  });

export const pumpTicketsQuery = (query: Query) =>
  queryOptions({
    queryKey: ['pump-tickets', query],
    queryFn: () => apiGet('/api/pump-tickets', listPumpTicketsOutput, query),
  });

export function isBeingRead(state: string | undefined): boolean {
  return state === 'waiting' || state === 'reading';
}

/** Where the browser gets a photo from. */
export const photoAddress = (photoId: string) => `/api/photos/${photoId}`;

/**
 * After a change: what is on the screen is asked for again, what is not is forgotten, so that the
 * next screen starts from what its page brings and not from yards of a moment ago.
 */
export async function refreshPourDay(queries: QueryClient): Promise<void> {
  queries.removeQueries({ queryKey: ['pour-day'], type: 'inactive' });
  await queries.invalidateQueries({ queryKey: ['pour-day'] });
}
