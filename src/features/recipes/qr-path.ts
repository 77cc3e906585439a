import { create } from "qrcode";

/** A QR code (ISO/IEC 18004) as an SVG path in a grid of `size` modules. */
export function qrPath(text: string): { size: number; path: string } {
  const { modules } = create(text, { errorCorrectionLevel: "M" });
  const dark = Array.from(modules.data, (isDark, i) => ({
    isDark,
    x: i % modules.size,
    y: Math.floor(i / modules.size),
  }));
  const path = dark
    .filter(({ isDark }) => isDark)
    .map(({ x, y }) => `M${x} ${y}h1v1h-1z`)
    .join("");
  return { size: modules.size, path };
}
