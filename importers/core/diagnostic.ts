import { z } from 'zod';
import { DIAGNOSTIC_CODE_LIST, type DiagnosticCode } from './codes';

export const SEVERITIES = ['error', 'warning', 'guess'] as const;
export type Severity = (typeof SEVERITIES)[number];

const placeSchema = z.object({
  file: z.string(),
  /** Physical line of the file, from 1; null where the whole file is meant. */
  line: z.number().int().min(1).nullable(),
  /** The column's title, or "column 3" where it has none. */
  column: z.string().nullable(),
  columnIndex: z.number().int().min(0).nullable(),
});

/** One thing that a person should know about a file, precise enough to go and look at it. */
export const diagnosticSchema = z.object({
  code: z.enum(DIAGNOSTIC_CODE_LIST),
  severity: z.enum(SEVERITIES),
  place: placeSchema,
  /** The text as it stands in the file. */
  raw: z.string().nullable(),
  expected: z.string().nullable(),
  got: z.string().nullable(),
  /** What to do next. */
  hint: z.string().nullable(),
  sentence: z.string(),
  /** A second place that bears on it: the line repeated, the total that differs. */
  also: placeSchema.nullable(),
});
export type Diagnostic = z.infer<typeof diagnosticSchema>;

/** What the finder of a problem states; the rest has defaults. */
export interface Observation {
  readonly code: DiagnosticCode;
  readonly severity: Severity;
  readonly sentence: string;
  readonly line?: number;
  readonly column?: string;
  readonly columnIndex?: number;
  readonly raw?: string;
  readonly expected?: string;
  readonly got?: string;
  readonly hint?: string;
  readonly alsoLine?: number;
}

/** Diagnostics are shown to a person: beyond this many of one severity, the number will do. */
const SHOWN_PER_SEVERITY = 100;
const RAW_SHOWN = 200;

export interface DiagnosticList {
  readonly diagnostics: Diagnostic[];
  /** How many more there are than are listed. */
  readonly more: number;
  readonly counts: Readonly<Record<Severity, number>>;
}

/** Collects everything that is found in one file, in order, with a cap for each severity. */
export class DiagnosticCollector {
  private readonly shown: Diagnostic[] = [];
  private readonly counts: Record<Severity, number> = { error: 0, warning: 0, guess: 0 };

  constructor(private readonly file: string) {}

  add(found: Observation): void {
    this.counts[found.severity] += 1;
    if (this.counts[found.severity] > SHOWN_PER_SEVERITY) return;
    this.shown.push({
      code: found.code,
      severity: found.severity,
      place: {
        file: this.file,
        line: found.line ?? null,
        column: found.column ?? null,
        columnIndex: found.columnIndex ?? null,
      },
      raw: found.raw === undefined ? null : found.raw.slice(0, RAW_SHOWN),
      expected: found.expected ?? null,
      got: found.got?.slice(0, RAW_SHOWN) ?? null,
      hint: found.hint ?? null,
      sentence: found.sentence,
      also:
        found.alsoLine === undefined
          ? null
          : { file: this.file, line: found.alsoLine, column: null, columnIndex: null },
    });
  }

  list(): DiagnosticList {
    const total = this.counts.error + this.counts.warning + this.counts.guess;
    return {
      diagnostics: [...this.shown],
      more: total - this.shown.length,
      counts: { ...this.counts },
    };
  }
}
