/** A label that wants to stand beside a point. Pixels; a higher priority is placed first. */
export interface Label {
  id: string;
  x: number;
  y: number;
  text: string;
  priority: number;
  /** Height of the letters, px. */
  size: number;
  /** Distance from the point to the text, px. */
  gap: number;
}
export interface Placed extends Label {
  textX: number;
  textY: number;
  anchor: 'start' | 'end' | 'middle';
}
interface Box {
  left: number;
  top: number;
  right: number;
  bottom: number;
}

/** Mean advance of B612 in units of its size; a little wide, so that labels never touch. */
const ADVANCE = 0.6;
const MARGIN = 3;

const apart = (a: Box, b: Box): boolean => a.right + MARGIN < b.left || b.right + MARGIN < a.left || a.bottom + MARGIN < b.top || b.bottom + MARGIN < a.top;

function candidates(label: Label): { placed: Placed; box: Box }[] {
  const width = label.text.length * label.size * ADVANCE;
  const half = label.size / 2;
  const at = (textX: number, textY: number, anchor: Placed['anchor']) => {
    const left = anchor === 'start' ? textX : anchor === 'end' ? textX - width : textX - width / 2;
    return { placed: { ...label, textX, textY, anchor }, box: { left, right: left + width, top: textY - half, bottom: textY + half } };
  };
  return [
    at(label.x + label.gap, label.y, 'start'),
    at(label.x - label.gap, label.y, 'end'),
    at(label.x, label.y - label.gap - half, 'middle'),
    at(label.x, label.y + label.gap + half, 'middle'),
  ];
}

/** Labels that fit the map without touching one another or the `taken` boxes; the others are left out. Same in, same out. */
export function placeLabels(labels: readonly Label[], size: { width: number; height: number }, taken: readonly Box[] = []): Placed[] {
  const boxes = [...taken];
  const placed: Placed[] = [];
  const order = [...labels].sort((a, b) => b.priority - a.priority || (a.id < b.id ? -1 : 1));
  for (const label of order) {
    for (const { placed: spot, box } of candidates(label)) {
      const inside = box.left >= 2 && box.right <= size.width - 2 && box.top >= 2 && box.bottom <= size.height - 2;
      if (!inside || !boxes.every((other) => apart(box, other))) continue;
      boxes.push(box);
      placed.push(spot);
      break;
    }
  }
  return placed;
}
