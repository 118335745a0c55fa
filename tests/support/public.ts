import type { z } from 'zod';
import type { Clock } from '../../lib/clock';
import { systemClock } from '../../lib/clock';
import type { PublicVerb } from '../../lib/services/public-verb';
import { callPublicVerb } from '../../lib/services/public-verb';

let nextAddress = 1;

/** A browser of the test's own: it keeps its session token and has its own network address. */
export function testBrowser(clock: Clock = systemClock) {
  const address = `192.0.2.${nextAddress++ % 250}-${Math.random()}`;
  let sessionToken: string | null = null;
  return {
    address,
    token: () => sessionToken,
    async ask<Input extends z.ZodType, Output extends z.ZodType>(
      verb: PublicVerb<Input, Output>,
      input: z.input<Input>,
    ) {
      const caller = { address, sessionToken, showsDemo: true };
      const { result, session } = await callPublicVerb(verb, input, caller, clock);
      if (session.kind === 'set') sessionToken = session.token;
      if (session.kind === 'clear') sessionToken = null;
      return result;
    },
  };
}
