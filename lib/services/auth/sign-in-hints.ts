import { findDemo } from '../../../db/queries/accounts';
import { DEMO_PASSWORD } from '../../auth/demo';
import { signInHintsInput, signInHintsOutput } from '../../contracts/auth';
import { ok } from '../../domain/result';
import { definePublicVerb } from '../public-verb';

export const signInHints = definePublicVerb({
  name: 'auth.signInHints',
  says: 'The demo company’s sign-ins, where there is one',
  http: { method: 'GET', path: '/api/sign-in-hints' },
  input: signInHintsInput,
  output: signInHintsOutput,
  async run(ctx) {
    const demo = ctx.showsDemo ? await findDemo(ctx.handle) : null;
    return ok({ demo: demo && { ...demo, password: DEMO_PASSWORD } });
  },
});
