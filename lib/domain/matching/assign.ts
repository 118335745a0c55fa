import { munkres } from 'munkres';
import { UNMATCHED_COST } from './score';

export interface Edge {
  readonly row: number;
  readonly column: number;
  readonly cost: number;
}

/** Costs are scaled so that the tie-break (keep the document's order) never outweighs a point. */
const SCALE = 10_000;
const LARGEST_TIE_BREAK = 20;
const IMPOSSIBLE = UNMATCHED_COST * SCALE * 1000;

function blocksOf(edges: readonly Edge[]): Edge[][] {
  const parent = new Map<string, string>();
  const find = (node: string): string => {
    let root = node;
    for (let up = parent.get(root); up !== undefined && up !== root; up = parent.get(root)) {
      root = up;
    }
    for (let at = node; at !== root; ) {
      const up = parent.get(at) ?? root;
      parent.set(at, root);
      at = up;
    }
    return root;
  };
  for (const { row, column } of edges) {
    for (const node of [`r${row}`, `c${column}`]) if (!parent.has(node)) parent.set(node, node);
    parent.set(find(`r${row}`), find(`c${column}`));
  }
  const blocks = new Map<string, Edge[]>();
  for (const edge of edges) {
    const root = find(`r${edge.row}`);
    const block = blocks.get(root) ?? [];
    block.push(edge);
    blocks.set(root, block);
  }
  return [...blocks.values()];
}

const ascending = (one: number, other: number) => one - other;

/** One connected block, solved whole: each row takes a column or stays without one. */
function solveBlock(block: readonly Edge[]): Edge[] {
  const [only] = block;
  if (block.length === 1 && only) return [only];
  const rows = [...new Set(block.map(({ row }) => row))].sort(ascending);
  const columns = [...new Set(block.map(({ column }) => column))].sort(ascending);
  const rowAt = new Map(rows.map((row, at) => [row, at]));
  const columnAt = new Map(columns.map((column, at) => [column, at]));
  const width = columns.length + rows.length;
  const costs = rows.map(() =>
    Array.from({ length: width }, (_, at) =>
      at < columns.length ? IMPOSSIBLE : UNMATCHED_COST * SCALE,
    ),
  );
  for (const { row, column, cost } of block) {
    const [y, x] = [rowAt.get(row) ?? 0, columnAt.get(column) ?? 0];
    const line = costs[y];
    if (line) line[x] = cost * SCALE + Math.min(Math.abs(y - x), LARGEST_TIE_BREAK);
  }
  const byPlace = new Map(block.map((edge) => [`${edge.row}:${edge.column}`, edge]));
  return munkres(costs).flatMap(([y, x]) => {
    const edge = byPlace.get(`${rows[y]}:${columns[x]}`);
    return edge ? [edge] : [];
  });
}

/**
 * Pairs rows with columns at minimum total cost, a row without a column costing
 * `UNMATCHED_COST`; never greedily. Rows and columns that no edge connects are solved apart, so
 * that the time grows with the number of blocks, not with the cube of the whole. Of equally cheap
 * solutions the one nearest to the given order is taken, so the result is always the same.
 */
export function assignAtMinimumCost(edges: readonly Edge[]): Edge[] {
  return blocksOf(edges)
    .flatMap(solveBlock)
    .sort((one, other) => one.row - other.row);
}
