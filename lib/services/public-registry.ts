import { acceptInvitation } from './auth/accept-invitation';
import { forgotPassword } from './auth/forgot-password';
import { getInvitation } from './auth/get-invitation';
import { resetPassword } from './auth/reset-password';
import { signIn } from './auth/sign-in';
import { signInHints } from './auth/sign-in-hints';
import { signOut } from './auth/sign-out';
import { signUp } from './auth/sign-up';
import type { PublicVerb } from './public-verb';

/** Every verb that needs no sign-in. What is not here or in the other registry is no door. */
export const PUBLIC_REGISTRY = [
  acceptInvitation,
  forgotPassword,
  getInvitation,
  resetPassword,
  signIn,
  signInHints,
  signOut,
  signUp,
] as unknown as readonly PublicVerb[];

/** Addresses that answer anyone and are no verb: they tell nothing about any company. */
export const PUBLIC_ADDRESSES = ['/api/health', '/api/openapi.json'] as const;
