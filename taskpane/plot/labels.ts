/** Something a label must keep clear of, with the room it wants about it, in pixels. */
export interface Spot { readonly x: number; readonly y: number; readonly room: number }

interface Pixel { readonly x: number; readonly y: number }
interface Frame { readonly left: number; readonly right: number; readonly top: number; readonly bottom: number }

/** A label closer to something than this is worse than no label. */
const TIGHTEST = 4;

/**
 * Where a label of a length stands best on a line: inside the frame, along the line's own slope,
 * as far as can be from everything taken. Undefined where there is no room on it.
 */
export function placeLabel(line: readonly Pixel[], length: number, frame: Frame, taken: readonly Spot[]): { readonly x: number; readonly y: number; readonly angle: number; readonly covers: readonly Pixel[] } | undefined {
  let best: { x: number; y: number; angle: number; covers: Pixel[]; clearance: number } | undefined;
  for (let i = 1; i < line.length - 1; i++) {
    const { x, y } = line[i]!, before = line[i - 1]!, after = line[i + 1]!;
    const slope = Math.atan2(after.y - before.y, after.x - before.x);
    const covers = [-0.5, -0.25, 0, 0.25, 0.5].map((share) => ({ x: x + share * length * Math.cos(slope), y: y + share * length * Math.sin(slope) }));
    const edges = Math.min(...covers.map((pixel) => Math.min(pixel.x - frame.left, frame.right - pixel.x, pixel.y - frame.top, frame.bottom - pixel.y)));
    if (edges < 6) continue;
    const clearance = Math.min(40, ...covers.flatMap((pixel) => taken.map((spot) => Math.hypot(pixel.x - spot.x, pixel.y - spot.y) - spot.room)));
    if (clearance >= TIGHTEST && (!best || clearance > best.clearance)) best = { x, y, angle: slope * 180 / Math.PI, covers, clearance };
  }
  return best;
}
