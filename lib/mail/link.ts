import { readEnv } from '../env';

/** A page's full address, for messages. */
export function linkTo(path: string): string {
  return new URL(path, readEnv().appOrigin).href;
}
