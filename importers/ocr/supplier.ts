import { distance } from 'fastest-levenshtein';
import type { Candidate, LookResult } from './candidates';
import { partsOf } from './labels';
import { type Segment, segmentsOf, textOf } from './lines';
import type { ReadContext } from './reading';

function letters(text: string): string {
  return text.toUpperCase().replace(/[^A-Z0-9]/g, '');
}

/** The known name that a text spells but for one letter in six, or null. */
export function knownName(text: string, names: readonly string[]): string | null {
  const wanted = letters(text);
  let best: { name: string; differs: number } | null = null;
  for (const name of names) {
    const known = letters(name);
    const differs = distance(wanted, known);
    if (differs * 6 <= known.length && (!best || differs < best.differs)) best = { name, differs };
  }
  return best?.name ?? null;
}

function confidenceOf(segment: Segment): number {
  return Math.min(...segment.words.map((word) => word.confidence));
}

function letterHeight(segment: Segment): number {
  const heights = segment.words.map((word) => word.box.height).sort((a, b) => a - b);
  return heights[Math.floor(heights.length / 2)] ?? 0;
}

function isNameLike(segment: Segment): boolean {
  const text = textOf(segment.words);
  const plain = text.replace(/[^A-Za-z]/g, '').length;
  return plain >= 6 && plain >= 0.8 * text.replace(/\s/g, '').length;
}

/**
 * The supplier has no label: it is the name that we know wherever it stands, or else the
 * largest writing in the upper third of the ticket.
 */
export function supplierOf(look: LookResult, context: ReadContext): Candidate | null {
  const names = context.suppliers?.map((supplier) => supplier.name) ?? [];
  const top = Math.min(...look.lines.map((line) => line.box.y));
  const end = Math.max(...look.lines.map((line) => line.box.y));
  const heads = look.lines.filter((line) => line.box.y <= top + (end - top) * 0.35);
  const segments = heads.flatMap((line) =>
    segmentsOf(partsOf(line).flatMap((part) => (part.kind === 'word' ? [part.word] : []))),
  );
  for (const segment of segments) {
    const name = knownName(textOf(segment.words), names);
    if (name) return candidate(segment, name);
  }
  const named = segments.filter(isNameLike).sort((a, b) => letterHeight(b) - letterHeight(a))[0];
  return named ? candidate(named, textOf(named.words).replace(/\s+/g, ' ').trim()) : null;
}

function candidate(segment: Segment, value: string): Candidate {
  const confidence = confidenceOf(segment);
  return { field: 'supplierName', value, repaired: false, confidence, box: segment.box };
}
