import type { Grey } from './grey';

const TILE_PX = 16;
/** The share of a tile that is darker than its paper; the rest is taken for grain. */
const DARKER_SHARE = 0.8;
/** Of the paper's light: what counts as black and as white after evening. */
const BLACK_SHARE = 0.25;
const WHITE_SHARE = 0.92;

/** The brightness of the paper in each tile: high among its pixels, but not a speck of grain. */
function tileLevels({ data, width, height }: Grey): Grey {
  const columns = Math.ceil(width / TILE_PX);
  const rows = Math.ceil(height / TILE_PX);
  const levels = new Uint8Array(columns * rows);
  const tile = new Uint8Array(TILE_PX * TILE_PX);
  for (let row = 0; row < rows; row += 1) {
    for (let column = 0; column < columns; column += 1) {
      let count = 0;
      for (let y = row * TILE_PX; y < Math.min(height, (row + 1) * TILE_PX); y += 1) {
        for (let x = column * TILE_PX; x < Math.min(width, (column + 1) * TILE_PX); x += 1) {
          tile[count] = data[y * width + x] ?? 0;
          count += 1;
        }
      }
      const sorted = tile.subarray(0, count).sort();
      levels[row * columns + column] = sorted[Math.floor(count * DARKER_SHARE)] ?? 0;
    }
  }
  return { data: levels, width: columns, height: rows };
}

/** Median of each tile and its neighbours: one bright speck must not pass for paper. */
function smoothed({ data, width, height }: Grey): Grey {
  const result = new Uint8Array(data.length);
  for (let y = 0; y < height; y += 1) {
    for (let x = 0; x < width; x += 1) {
      const around: number[] = [];
      for (let dy = -1; dy <= 1; dy += 1) {
        for (let dx = -1; dx <= 1; dx += 1) {
          const inside = x + dx >= 0 && x + dx < width && y + dy >= 0 && y + dy < height;
          if (inside) around.push(data[(y + dy) * width + x + dx] ?? 0);
        }
      }
      around.sort((a, b) => a - b);
      result[y * width + x] = around[Math.floor(around.length / 2)] ?? 0;
    }
  }
  return { data: result, width, height };
}

/**
 * Paper in a hand's shadow keeps about half of its light; what is darker than this share of the
 * brightest paper is table, whose grain would come out as a sea of letters.
 */
const TABLE_BELOW = 0.4;

/** The tile level that nineteen of twenty tiles do not reach: the paper in full light. */
function brightLevel({ data }: Grey): number {
  const sorted = Uint8Array.from(data).sort();
  return sorted[Math.floor(sorted.length * 0.95)] ?? 255;
}

/** Tile levels spread to one value a column, between the middles of neighbouring tiles. */
function levelsOfRow(tiles: Grey, y: number, levels: Float32Array): void {
  const v = Math.max(0, Math.min(tiles.height - 1, y / TILE_PX - 0.5));
  const top = Math.floor(v);
  const bottom = Math.min(tiles.height - 1, top + 1);
  const down = v - top;
  for (let x = 0; x < levels.length; x += 1) {
    const u = Math.max(0, Math.min(tiles.width - 1, x / TILE_PX - 0.5));
    const left = Math.floor(u);
    const right = Math.min(tiles.width - 1, left + 1);
    const across = u - left;
    const above =
      (tiles.data[top * tiles.width + left] ?? 0) * (1 - across) +
      (tiles.data[top * tiles.width + right] ?? 0) * across;
    const below =
      (tiles.data[bottom * tiles.width + left] ?? 0) * (1 - across) +
      (tiles.data[bottom * tiles.width + right] ?? 0) * across;
    levels[x] = above * (1 - down) + below * down;
  }
}

/**
 * Divides a picture by its background, so that shadow and coloured paper become one white, and
 * whitens what is too dark to be paper. A fixed threshold would lose every word in the shadow.
 */
export function evenLight(picture: Grey): Grey {
  const { width, height } = picture;
  const tiles = smoothed(tileLevels(picture));
  const tableBelow = Math.max(16, brightLevel(tiles) * TABLE_BELOW);
  const data = new Uint8Array(picture.data.length);
  const levels = new Float32Array(width);
  for (let y = 0; y < height; y += 1) {
    levelsOfRow(tiles, y, levels);
    for (let x = 0; x < width; x += 1) {
      const at = y * width + x;
      const level = levels[x] ?? 0;
      const share = ((picture.data[at] ?? 0) / level - BLACK_SHARE) / (WHITE_SHARE - BLACK_SHARE);
      data[at] = level < tableBelow ? 255 : Math.max(0, Math.min(255, Math.round(share * 255)));
    }
  }
  return { data, width, height };
}
