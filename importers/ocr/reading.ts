import { z } from 'zod';

/**
 * What reading a photographed ticket gives. Browser-safe: no image library or engine behind it.
 */
export const TICKET_FIELDS = [
  'ticketNumber',
  'supplierName',
  'date',
  'plant',
  'truck',
  'orderNumber',
  'poNumber',
  'jobName',
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
export type TicketField = (typeof TICKET_FIELDS)[number];

/** A place on the photo, in pixels of the upright original, so the screen can show the spot. */
export const boxSchema = z.object({
  x: z.number().int().min(0),
  y: z.number().int().min(0),
  width: z.number().int().min(1),
  height: z.number().int().min(1),
});
export type Box = z.infer<typeof boxSchema>;

export const fieldReadingSchema = z.object({
  /**
   * As text: dates "2026-11-12", clock times "06:40" (24 h), yards and gallons as printed
   * without their unit ("10.00"), names and numbers as printed.
   */
  value: z.string().min(1),
  /** 0 to 1; how likely the value is right, after all checks. */
  confidence: z.number().min(0).max(1),
  /** A person should look: nothing but the engine's own word supports the value. */
  doubtful: z.boolean(),
  box: boxSchema,
});

/** Fields by name; one that is not on the ticket is absent. */
export const ticketFieldsSchema = z.partialRecord(z.enum(TICKET_FIELDS), fieldReadingSchema);
export type TicketFields = z.infer<typeof ticketFieldsSchema>;

export const READING_NOTES = {
  blurred: 'The photo is blurred. Hold still and take it again if fields are missing.',
  dark: 'The photo is too dark. Take it again with more light if fields are missing.',
  toDateDiffers: 'The yards to date on the ticket are less than this load.',
  timesOutOfOrder: 'The times on the ticket are not in order.',
} as const;
export type ReadingNoteCode = keyof typeof READING_NOTES;

export const readingNoteSchema = z.object({
  code: z.enum(Object.keys(READING_NOTES) as [ReadingNoteCode, ...ReadingNoteCode[]]),
  sentence: z.string(),
});
export type ReadingNote = z.infer<typeof readingNoteSchema>;

export const ticketReadingSchema = z.object({
  fields: ticketFieldsSchema,
  notes: z.array(readingNoteSchema),
  /** Size of the upright original: the space in which the boxes are given. */
  image: z.object({ widthPx: z.number().int().min(1), heightPx: z.number().int().min(1) }),
});
export type TicketReading = z.infer<typeof ticketReadingSchema>;

/** Why a photo could not be read; each code's sentence says what to do next. */
export const READ_FAILURES = {
  empty: 'The file is empty. Take the photo again.',
  tooLarge: 'The file is larger than 20 MB. Send a smaller photo.',
  tooManyPixels: 'The picture has more than 50 million pixels. Send a smaller photo.',
  tooSmall: 'The picture is too small to hold a readable ticket. Take the photo again.',
  notAPhoto: 'The file is not a photo. Send a JPEG, PNG or WebP picture.',
  heic: 'The file is a HEIC picture. Send it as JPEG.',
  pdf: 'The file is a PDF document. Send a photo as JPEG, PNG or WebP.',
  gif: 'The file is a GIF picture. Send a photo as JPEG, PNG or WebP.',
  tiff: 'The file is a TIFF picture. Send a photo as JPEG, PNG or WebP.',
  svg: 'The file is an SVG drawing. Send a photo as JPEG, PNG or WebP.',
  damaged: 'The picture is damaged or cut short. Take or send the photo again.',
  noTicket: 'No ticket can be made out in this photo. Take it again, closer and straight above.',
  blurred: 'The photo is too blurred to read. Hold the phone still and take it again.',
  dark: 'The photo is too dark to read. Take it again with more light.',
  engine: 'The ticket reader did not answer. The photo is kept; try again.',
} as const;
export type ReadFailureCode = keyof typeof READ_FAILURES;

export interface ReadFailure {
  readonly code: ReadFailureCode;
  readonly sentence: string;
}

/** What is already known, to check a reading against. Everything is optional. */
export interface ReadContext {
  /** The company's present day, "2026-12-01"; dates far from it are doubtful. */
  readonly today?: string;
  readonly suppliers?: readonly {
    readonly name: string;
    readonly mixCodes: readonly string[];
  }[];
  readonly orders?: readonly {
    readonly number: string;
    readonly supplierName?: string;
    readonly jobName?: string;
    readonly mixCode?: string;
    readonly orderedYd3?: string;
    readonly date?: string;
  }[];
  readonly jobs?: readonly string[];
}
