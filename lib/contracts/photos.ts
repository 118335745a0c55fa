import { z } from 'zod';
import { boxSchema, readingNoteSchema, ticketFieldsSchema } from '../../importers/ocr/reading';
import { uuid } from './common';

export const MAX_PHOTO_BYTES = 20 * 1024 * 1024;
export const MAX_PHOTO_PIXELS = 50_000_000;

/** The fields of a ticket that a reading can fill in, by the form's names. */
export const SUGGESTED_FIELDS = [
  'number',
  'supplierId',
  'date',
  'plant',
  'truck',
  'mixCode',
  'quantityYd3',
  'orderedYd3',
  'toDateYd3',
  'loadNumber',
  'batchedAt',
  'arrivedAt',
  'startedAt',
  'finishedAt',
  'leftAt',
  'waterAddedGal',
] as const;

/** What the reading would put into the ticket, as a form shows it; absent where it says nothing. */
export const suggestion = z.object({
  values: z.partialRecord(z.enum(SUGGESTED_FIELDS), z.string()),
  orderId: uuid.nullable(),
  /** Fields that a person has to look at before the ticket is confirmed. */
  doubtful: z.array(z.enum(SUGGESTED_FIELDS)),
  /** Where each field stands on the photo. */
  boxes: z.partialRecord(z.enum(SUGGESTED_FIELDS), boxSchema),
});
export type Suggestion = z.infer<typeof suggestion>;

export const READING_STATES = ['waiting', 'reading', 'read', 'failed'] as const;

export const reading = z.object({
  photoId: uuid,
  state: z.enum(READING_STATES),
  /** Why nothing could be read, and in words; null unless the state is `failed`. */
  failureCode: z.string().nullable(),
  failureSentence: z.string().nullable(),
  fields: ticketFieldsSchema.nullable(),
  /** What else a person should know about the photo. */
  notes: z.array(readingNoteSchema),
  suggestion: suggestion.nullable(),
});
export type Reading = z.infer<typeof reading>;

export const photo = z.object({
  id: uuid,
  widthPx: z.number().int(),
  heightPx: z.number().int(),
  takenBy: z.string(),
  reading,
});
export type Photo = z.infer<typeof photo>;

export const uploadPhotoInput = z.strictObject({
  placementId: uuid,
  /** Made on the device before the first send, so that a repeat is recognised. */
  clientId: uuid,
  /** Another photo of a ticket that is there already; without it a new ticket begins. */
  ticketId: uuid.optional(),
  fileName: z.string(),
  bytes: z.custom<Uint8Array>((value) => value instanceof Uint8Array),
});
export const uploadPhotoOutput = z.object({
  ticketId: uuid,
  photoId: uuid,
  /** True when this photo was here before and nothing was added. */
  repeated: z.boolean(),
});

export const getPhotoInput = z.strictObject({ photoId: uuid });
