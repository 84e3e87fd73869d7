function channel(byte: number): number {
  const value = byte / 255;
  return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
}

function luminance(hex: string): number {
  const match = /^#([0-9a-f]{2})([0-9a-f]{2})([0-9a-f]{2})$/i.exec(hex);
  if (!match) throw new Error(`not a colour of six digits: ${hex}`);
  const [red = 0, green = 0, blue = 0] = match.slice(1).map((part) => channel(Number.parseInt(part, 16)));
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

/** Contrast of two opaque colours (`#rrggbb`), from 1 to 21. WCAG 2.2, definition of "contrast ratio". */
export function contrastRatio(a: string, b: string): number {
  const [dark = 0, light = 0] = [luminance(a), luminance(b)].sort((x, y) => x - y);
  return (light + 0.05) / (dark + 0.05);
}
