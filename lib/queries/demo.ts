import { queryOptions } from '@tanstack/react-query';
import { listDemoFilesOutput } from '../contracts/demo';
import { apiGet } from './api';

export const demoFilesQuery = () =>
  queryOptions({
    queryKey: ['demo', 'files'],
    queryFn: () => apiGet('/api/demo/files', listDemoFilesOutput),
    staleTime: Number.POSITIVE_INFINITY,
  });

/** Fetches a demo file as if it had been chosen from the device. */
export async function demoFile(name: string): Promise<File> {
  const answer = await fetch(`/api/demo/files/${encodeURIComponent(name)}`);
  if (!answer.ok) throw new Error(`The demo file ${name} did not come: ${answer.status}`);
  return new File([await answer.blob()], name);
}
