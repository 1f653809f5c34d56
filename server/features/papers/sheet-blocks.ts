import { contentWidth, ink, lineHeight, margin, type Sheet, type TextStyle } from './sheet.ts';

export interface Fact {
  label: string;
  value: string;
}

/** The head of a paper, ruled like a drawing's title block: name, state, then the facts. */
export function titleBlock(sheet: Sheet, title: string, state: string, facts: readonly Fact[]) {
  const columns = 4;
  const width = contentWidth / columns;
  sheet.rule(sheet.y);
  const stateWidth = 150;
  const titleHeight = sheet.textAt(title, margin, sheet.y + 5, contentWidth - stateWidth, {
    face: 'strong',
    size: 14,
    maxLines: 2,
  });
  sheet.textAt(state, margin, sheet.y + 9, contentWidth, {
    face: 'strong',
    size: 9.5,
    align: 'right',
  });
  sheet.y += titleHeight + 8;
  for (let first = 0; first < facts.length; first += columns) {
    sheet.rule(sheet.y, ink.hairline);
    const row = facts.slice(first, first + columns);
    const heights = row.map(({ label, value }, index) => {
      const x = margin + index * width + (index === 0 ? 0 : 5);
      const inner = width - 8;
      sheet.textAt(label, x, sheet.y + 2, inner, { size: 6.5, color: ink.faint, maxLines: 1 });
      return sheet.textAt(value, x, sheet.y + 10, inner, { size: 8.5, maxLines: 2 });
    });
    sheet.y += Math.max(...heights) + 13;
  }
  sheet.rule(sheet.y);
  sheet.y += 6;
}

/** As many of the items as the height allows; says how many it left out. Returns the height used. */
export function listWithin(
  sheet: Sheet,
  items: readonly string[],
  place: { x: number; y: number; width: number; height: number },
  style: TextStyle = {},
): number {
  const indent = 9;
  const gap = 1.5;
  let used = 0;
  for (const [index, item] of items.entries()) {
    const height = sheet.heightOf(item, place.width - indent, style);
    const isLast = index === items.length - 1;
    const room = place.height - used - (isLast ? 0 : lineHeight(style) + gap);
    if (height > room) {
      const rest = items.length - index;
      const note = `${rest} more on the page of the finding.`;
      used += sheet.textAt(note, place.x + indent, place.y + used, place.width - indent, {
        ...style,
        color: ink.faint,
        maxLines: 1,
      });
      return used;
    }
    sheet.textAt('·', place.x, place.y + used, indent, { ...style, face: 'strong' });
    sheet.textAt(item, place.x + indent, place.y + used, place.width - indent, style);
    used += height + gap;
  }
  return used;
}

/** A field to fill by hand, label above a line, or with what was filled in. */
export function blank(
  sheet: Sheet,
  label: string,
  place: { x: number; width: number; height?: number },
  filled: string | null = null,
): void {
  const { x, width, height = 24 } = place;
  sheet.textAt(label, x, sheet.y, width, { size: 6.5, color: ink.faint, maxLines: 1 });
  if (filled !== null) {
    sheet.textAt(filled, x, sheet.y + height - 10, width, { size: 7.5, maxLines: 1 });
  }
  sheet.rule(sheet.y + height, ink.full, x, width);
}
