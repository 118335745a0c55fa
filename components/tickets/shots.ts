'use client';

import { useSyncExternalStore } from 'react';
import type { z } from 'zod';
import { uploadPhotoOutput } from '@/lib/contracts/photos';
import { ApiFailure, apiUpload } from '@/lib/queries/api';
import { newClientId } from './client-id';
import { shrinkPhoto } from './shrink-photo';

/** A photo that has been taken and is not yet on the server. */
export interface Shot {
  readonly clientId: string;
  readonly placementId: string;
  /** The ticket that it is another photo of; null for a new ticket. */
  readonly ticketId: string | null;
  readonly name: string;
  readonly picture: Blob;
  readonly state: 'preparing' | 'sending' | 'failed';
  /** Why the last attempt failed. */
  readonly problem: { readonly code: string; readonly message: string } | null;
}
export type Sent = z.infer<typeof uploadPhotoOutput>;

/*
 * Kept outside the components, so that going to another screen and back loses no photo that is
 * still to be sent. Leaving the product altogether is warned about.
 */
let shots: readonly Shot[] = [];
const listeners = new Set<() => void>();
const NONE: readonly Shot[] = [];

function replace(next: readonly Shot[]): void {
  shots = next;
  if (shots.length > 0) window.addEventListener('beforeunload', warn);
  else window.removeEventListener('beforeunload', warn);
  for (const listener of listeners) listener();
}

function warn(event: BeforeUnloadEvent): void {
  event.preventDefault();
}

function change(clientId: string, values: Partial<Shot>): void {
  replace(shots.map((shot) => (shot.clientId === clientId ? { ...shot, ...values } : shot)));
}

function subscribe(listener: () => void): () => void {
  listeners.add(listener);
  return () => listeners.delete(listener);
}

/** Every photo that is still to be sent. */
export function useShots(): readonly Shot[] {
  return useSyncExternalStore(
    subscribe,
    () => shots,
    () => NONE,
  );
}

/** Takes a photo in, makes it small and sends it; null when it could not be sent now. */
export async function takeShot(
  file: File,
  target: { readonly placementId: string; readonly ticketId: string | null },
): Promise<Sent | null> {
  const clientId = newClientId();
  const shot: Shot = {
    ...target,
    clientId,
    name: file.name,
    picture: file,
    state: 'preparing',
    problem: null,
  };
  replace([...shots, shot]);
  change(clientId, { picture: await shrinkPhoto(file) });
  return sendShot(clientId);
}

/** Sends a photo, again if need be: the server recognises it and never doubles it. */
export async function sendShot(clientId: string): Promise<Sent | null> {
  const shot = shots.find((one) => one.clientId === clientId);
  if (!shot) return null;
  change(clientId, { state: 'sending', problem: null });
  try {
    const sent = await apiUpload(
      `/api/placements/${shot.placementId}/photos`,
      { body: shot.picture, name: shot.name },
      uploadPhotoOutput,
      { clientId, ticketId: shot.ticketId },
    );
    dropShot(clientId);
    return sent;
  } catch (error) {
    const { code, message } =
      error instanceof ApiFailure ? error : { code: 'unexpected', message: String(error) };
    change(clientId, { state: 'failed', problem: { code, message } });
    return null;
  }
}

export function dropShot(clientId: string): void {
  replace(shots.filter((shot) => shot.clientId !== clientId));
}
