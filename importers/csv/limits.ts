/** What the importer reads at most. A statement of a busy month is far below each of these. */
export const MAX_BYTES = 10 * 1024 * 1024;
export const MAX_ROWS = 20_000;
export const MAX_COLUMNS = 60;
export const MAX_CELL_CHARACTERS = 2_000;
/** A quoted cell may hold line breaks, but one that runs on past this is a quote never closed. */
export const MAX_LINES_PER_RECORD = 20;
