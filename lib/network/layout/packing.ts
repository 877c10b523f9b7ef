/** One laid-out component: its nodes and their positions. */
export interface LaidOutPart {
  nodes: Uint32Array;
  x: Float64Array;
  y: Float64Array;
}

interface Box {
  left: number;
  top: number;
  width: number;
  height: number;
}

/**
 * Places the disconnected parts of a map beside each other: the first (largest) in the middle, every other as near to the middle as it fits.
 * Room is kept on a grid: cells in which a node stands, and the cells around them, are taken. Parts are rigid: they are moved, never turned.
 * Cost O(cells * parts) at worst; parts of equal size go on from where the last one fitted, so many small ones stay cheap. Deterministic.
 * Moves the positions in place.
 */
export function packParts(parts: LaidOutPart[]): void {
  if (parts.length === 0) return;
  centre(parts[0]);
  if (parts.length === 1) return;
  const boxes = parts.map(boxOf);
  const spacing = nodeSpacing(parts[0], boxes[0]);
  const area = boxes.reduce((sum, box) => sum + (box.width + 2 * spacing) * (box.height + 2 * spacing), 0);
  const reach = Math.max(Math.sqrt(area), boxes[0].width, boxes[0].height) * 1.2 + 4 * spacing;
  // Fine enough for the smallest part, but never more than 400 cells across.
  const cell = Math.max(2 * spacing, (2 * reach) / 400);
  const side = 2 * Math.ceil(reach / cell) + 1;
  const taken = new Uint8Array(side * side);
  const order = cellsFromMiddle(side);
  occupy(parts[0], taken, side, cell);
  let lastWidth = -1;
  let lastHeight = -1;
  let from = 0;
  for (let number = 1; number < parts.length; number += 1) {
    const across = Math.max(1, Math.ceil(boxes[number].width / cell));
    const down = Math.max(1, Math.ceil(boxes[number].height / cell));
    if (across !== lastWidth || down !== lastHeight) from = 0;
    while (from < order.length && !isFree(taken, side, order[from], across, down)) from += 1;
    // The grid holds every box once over, but not every way of filling it: what no longer fits stands in a row below.
    const place = from < order.length ? order[from] : -1;
    const column = place < 0 ? number % side : place % side;
    const row = place < 0 ? side + number : Math.floor(place / side);
    if (place >= 0) for (let line = row; line < row + down; line += 1) taken.fill(1, line * side + column, line * side + column + across);
    const middle = (side - 1) / 2;
    const atX = (column - middle + across / 2 - 0.5) * cell;
    const atY = (row - middle + down / 2 - 0.5) * cell;
    move(parts[number], atX - (boxes[number].left + boxes[number].width / 2), atY - (boxes[number].top + boxes[number].height / 2));
    lastWidth = across;
    lastHeight = down;
  }
}

function boxOf({ x, y }: LaidOutPart): Box {
  let left = Infinity;
  let right = -Infinity;
  let top = Infinity;
  let bottom = -Infinity;
  for (let node = 0; node < x.length; node += 1) {
    left = Math.min(left, x[node]);
    right = Math.max(right, x[node]);
    top = Math.min(top, y[node]);
    bottom = Math.max(bottom, y[node]);
  }
  return { left, top, width: right - left, height: bottom - top };
}

/** Typical distance between nodes of the largest part. */
function nodeSpacing(part: LaidOutPart, box: Box): number {
  return Math.max(1e-6, Math.sqrt((Math.max(box.width, 1e-6) * Math.max(box.height, 1e-6)) / part.nodes.length));
}

function centre(part: LaidOutPart): void {
  const box = boxOf(part);
  move(part, -(box.left + box.width / 2), -(box.top + box.height / 2));
}

function move({ x, y }: LaidOutPart, byX: number, byY: number): void {
  for (let node = 0; node < x.length; node += 1) {
    x[node] += byX;
    y[node] += byY;
  }
}

function occupy({ x, y }: LaidOutPart, taken: Uint8Array, side: number, cell: number): void {
  const middle = (side - 1) / 2;
  for (let node = 0; node < x.length; node += 1) {
    const column = Math.round(x[node] / cell) + middle;
    const row = Math.round(y[node] / cell) + middle;
    for (let line = Math.max(0, row - 1); line <= Math.min(side - 1, row + 1); line += 1) {
      taken.fill(1, line * side + Math.max(0, column - 1), line * side + Math.min(side - 1, column + 1) + 1);
    }
  }
}

function isFree(taken: Uint8Array, side: number, place: number, across: number, down: number): boolean {
  const column = place % side;
  const row = Math.floor(place / side);
  if (column + across > side || row + down > side) return false;
  for (let line = row; line < row + down; line += 1) {
    for (let next = column; next < column + across; next += 1) if (taken[line * side + next] === 1) return false;
  }
  return true;
}

/** All cells, those nearest to the middle first; equal distances in reading order. */
function cellsFromMiddle(side: number): Uint32Array {
  const middle = (side - 1) / 2;
  const cells = Array.from({ length: side * side }, (_, place) => place);
  const distance = (place: number): number => ((place % side) - middle) ** 2 + (Math.floor(place / side) - middle) ** 2;
  const distances = Float64Array.from(cells, distance);
  return Uint32Array.from(cells.sort((one, other) => distances[one] - distances[other] || one - other));
}
