/**
 * Moves labels along one axis until none overlap, each as near to its place as the others allow (least squares, by
 * pooling neighbours: Ayer, Brunk, Ewing, Reid & Silverman, "An empirical distribution function for sampling with
 * incomplete information", Annals of Mathematical Statistics 26, 1955).
 * @param wanted centre that each label wants, pixels
 * @param sizes space that each label needs along the axis, pixels
 * @param low @param high where labels may lie; the whole is kept inside as far as it fits
 * @returns centres, in the order of `wanted`
 */
export const spreadLabels = (
  wanted: readonly number[],
  sizes: readonly number[],
  low: number,
  high: number,
): number[] => {
  const order = wanted.map((_, i) => i).sort((a, b) => wanted[a] - wanted[b] || a - b);
  // A block is a run of touching labels; `start` is where its first label begins if the block sits best.
  const blocks: { members: number[]; size: number; start: number }[] = [];
  for (const i of order) {
    let block = { members: [i], size: sizes[i], start: wanted[i] - sizes[i] / 2 };
    for (let last = blocks.at(-1); last && last.start + last.size > block.start; last = blocks.at(-1)) {
      blocks.pop();
      const count = last.members.length + block.members.length;
      block = {
        members: [...last.members, ...block.members],
        size: last.size + block.size,
        start: (last.start * last.members.length + (block.start - last.size) * block.members.length) / count,
      };
    }
    const fits = Math.max(low, Math.min(block.start, high - block.size));
    blocks.push({ ...block, start: fits });
  }
  // Clamping at the edges may have made blocks touch again: push down from the top, then up from the bottom.
  for (let b = 1; b < blocks.length; b++)
    blocks[b].start = Math.max(blocks[b].start, blocks[b - 1].start + blocks[b - 1].size);
  for (let b = blocks.length - 1, limit = high; b >= 0; b--) {
    blocks[b].start = Math.min(blocks[b].start, limit - blocks[b].size);
    limit = blocks[b].start;
  }
  const centres = new Array<number>(wanted.length);
  for (const { members, start } of blocks) {
    let at = start;
    for (const i of members) {
      centres[i] = at + sizes[i] / 2;
      at += sizes[i];
    }
  }
  return centres;
};
