import { FIELD_KINDS, type FieldValue } from './fields/field-kind';
import type { Rect } from './image/grey';
import { type Label, partsOf } from './labels';
import {
  around,
  bottom,
  type Line,
  linesOf,
  right,
  type Segment,
  segmentsOf,
  textOf,
} from './lines';
import type { TicketField } from './reading';
import type { Word } from './words';

/** A value that one look at the ticket found for a field. */
export interface Candidate extends FieldValue {
  readonly field: TicketField;
  /** The engine's lowest word. */
  readonly confidence: number;
  readonly box: Rect;
}

export interface LookResult {
  readonly candidates: ReadonlyMap<TicketField, Candidate>;
  readonly lines: readonly Line[];
  /** How many labels were recognised at all: a picture without any is no ticket. */
  readonly labelCount: number;
}

interface LabelledLine {
  readonly box: Rect;
  readonly labels: readonly Label[];
  /** For each label, the segment that follows it before the next label. */
  readonly following: ReadonlyMap<Label, Segment>;
  readonly segments: readonly Segment[];
  /** A row of headings over a row of values. */
  readonly isHeading: boolean;
}

function labelled(line: Line): LabelledLine {
  const labels: Label[] = [];
  const following = new Map<Label, Segment>();
  const segments: Segment[] = [];
  let run: Word[] = [];
  const close = () => {
    const parted = segmentsOf(run);
    segments.push(...parted);
    const label = labels[labels.length - 1];
    if (label && parted[0]) following.set(label, parted[0]);
    run = [];
  };
  for (const part of partsOf(line)) {
    if (part.kind === 'word') run.push(part.word);
    else {
      close();
      labels.push(part.label);
    }
  }
  close();
  const colons = labels.some((label) => label.hasColon);
  const isHeading = labels.length >= 2 && !colons && following.size * 2 <= labels.length;
  return { box: line.box, labels, following, segments, isHeading };
}

/** A field's value in exactly these words. */
export function candidateFrom(field: TicketField, words: readonly Word[]): Candidate | null {
  const read = FIELD_KINDS[field](textOf(words));
  if (!read) return null;
  const confidence = Math.min(...words.map((word) => word.confidence));
  return { ...read, field, box: around(words), confidence };
}

/** A field's value in a segment: from all its words, or from as many first words as make sense. */
export function candidateIn(field: TicketField, segment: Segment): Candidate | null {
  for (let count = segment.words.length; count >= 1; count -= 1) {
    const words = segment.words.slice(0, count);
    const found = candidateFrom(field, words);
    if (found) return found;
  }
  return null;
}

/** How far a segment is from standing under a label: at its left edge or under its middle. */
function offset(label: Rect, value: Rect): number {
  const atLeft = Math.abs(value.x - label.x);
  const atMiddle = Math.abs(value.x + value.width / 2 - (label.x + label.width / 2));
  return Math.min(atLeft, atMiddle);
}

/** The segments that stand under a label, nearest line first. */
function segmentUnder(label: Label, row: LabelledLine, below: readonly LabelledLine[]) {
  const { box } = label;
  for (const line of below) {
    const near = line.segments.filter((segment) => {
      const drop = segment.box.y - bottom(box);
      const limit = 2.4 * Math.max(box.height, segment.box.height);
      if (drop < -0.5 * box.height || drop > limit) return false;
      if (offset(box, segment.box) > 3.5 * segment.box.height + box.width / 2) return false;
      // A value belongs to the label of its row that it stands nearest to.
      return row.labels.every(
        (other) => offset(box, segment.box) <= offset(other.box, segment.box),
      );
    });
    const nearest = near.sort((a, b) => offset(box, a.box) - offset(box, b.box))[0];
    if (nearest) return nearest;
    const covered = line.labels.some(
      (other) => other.box.x < right(box) && right(other.box) > box.x && other.box.y > bottom(box),
    );
    if (covered) return null;
  }
  return null;
}

function candidateFor(
  label: Label,
  field: TicketField,
  row: LabelledLine,
  below: readonly LabelledLine[],
): Candidate | null {
  const beside = row.isHeading ? undefined : row.following.get(label);
  const found = beside ? candidateIn(field, beside) : null;
  if (found) return found;
  if (label.hasColon) return null;
  const under = segmentUnder(label, row, below);
  return under ? candidateIn(field, under) : null;
}

/** Of two labels for one field: the one spelled better, then the longer. */
function isBetter(label: Label, than: Label): boolean {
  if (label.differs !== than.differs) return label.differs < than.differs;
  return label.length > than.length;
}

/** Finds the fields of a ticket among the words of one look, by label and position. */
export function candidatesOf(words: readonly Word[]): LookResult {
  const lines = linesOf(words);
  const rows = lines.map(labelled);
  const found = new Map<TicketField, { candidate: Candidate; label: Label }>();
  rows.forEach((row, index) => {
    const below = rows.slice(index + 1, index + 7);
    for (const label of row.labels) {
      if (!label.field) continue;
      const candidate = candidateFor(label, label.field, row, below);
      const other = found.get(label.field);
      if (candidate && (!other || isBetter(label, other.label))) {
        found.set(label.field, { candidate, label });
      }
    }
  });
  const candidates = new Map([...found].map(([field, { candidate }]) => [field, candidate]));
  return {
    candidates,
    lines,
    labelCount: rows.reduce((sum, row) => sum + row.labels.length, 0),
  };
}
