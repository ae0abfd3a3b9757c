/**
 * The outline of a growth ring: nearly round, its waver fixed by its number, so that a ring looks the same
 * wherever and whenever it is drawn.
 */
export function ringPath(centre: number, radius: number, seed: number): string {
  const points = 14;
  const waver = (angle: number) =>
    1 +
    0.028 * Math.sin(2 * angle + seed * 1.7) +
    0.02 * Math.sin(3 * angle + seed * 0.6) +
    0.012 * Math.sin(5 * angle + seed * 2.9);
  const at = (i: number) => {
    const angle = (i / points) * 2 * Math.PI;
    const r = radius * waver(angle);
    return [centre + r * Math.cos(angle), centre + r * Math.sin(angle)] as const;
  };
  const text = (x: number, y: number) => `${x.toFixed(2)},${y.toFixed(2)}`;
  let path = '';
  for (let i = 0; i < points; i += 1) {
    const [x0, y0] = at(i - 1);
    const [x1, y1] = at(i);
    const [x2, y2] = at(i + 1);
    const [x3, y3] = at(i + 2);
    if (i === 0) path = `M${text(x1, y1)}`;
    // Catmull-Rom through the points, as cubic Bézier curves.
    path += ` C${text(x1 + (x2 - x0) / 6, y1 + (y2 - y0) / 6)} ${text(x2 - (x3 - x1) / 6, y2 - (y3 - y1) / 6)} ${text(x2, y2)}`;
  }
  return `${path}Z`;
}
