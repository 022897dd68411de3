import type { ReportPicture } from '#common/schemas/report';

import { inks, styles, type PageFlow } from './page-flow.js';

/** The colour moved toward white or black by a share. */
function mixed(hex: string, toward: number, share: number): string {
  const value = Number.parseInt(hex.slice(1), 16);
  const parts = [(value >> 16) & 255, (value >> 8) & 255, value & 255];
  return `#${parts
    .map((part) =>
      Math.round(part + (toward - part) * share)
        .toString(16)
        .padStart(2, '0'),
    )
    .join('')}`;
}

/** Draws the lattice into a square and its legend under it; returns the depth used. */
export function drawPicture(
  picture: ReportPicture,
  flow: PageFlow,
  x: number,
  y: number,
  side: number,
): number {
  const { doc } = flow;
  for (const { x1, y1, x2, y2 } of picture.edges) {
    doc
      .moveTo(x + x1 * side, y + y1 * side)
      .lineTo(x + x2 * side, y + y2 * side)
      .lineWidth(0.7)
      .strokeColor(inks.soft)
      .stroke();
  }
  for (const ball of picture.balls) {
    const [cx, cy, radius] = [x + ball.x * side, y + ball.y * side, ball.radius * side];
    const shade = doc.radialGradient(
      cx - radius * 0.35,
      cy - radius * 0.4,
      radius * 0.05,
      cx,
      cy,
      radius,
    );
    shade
      .stop(0, mixed(ball.colour, 255, 0.55))
      .stop(0.45, ball.colour)
      .stop(1, mixed(ball.colour, 0, 0.3));
    doc.circle(cx, cy, radius).fill(shade);
    doc.circle(cx, cy, radius).lineWidth(0.3).strokeColor('#FFFFFF').stroke();
  }
  return side + drawLegend(picture, flow, x, y + side + 6, side);
}

function drawLegend(
  { legend }: ReportPicture,
  flow: PageFlow,
  x: number,
  y: number,
  width: number,
): number {
  const step = 12;
  let [at, line] = [x, 0];
  for (const { ion, colour } of legend) {
    const wide = flow.type.width(ion, styles.soft) + 22;
    if (at > x && at + wide > x + width) {
      at = x;
      line += 1;
    }
    const base = y + line * step;
    flow.doc.circle(at + 4, base + 5, 3.5).fill(colour);
    flow.type.draw(ion, at + 11, base + 8, styles.soft);
    at += wide;
  }
  return 6 + (line + 1) * step;
}
