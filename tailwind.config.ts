import type { Config } from "tailwindcss";
import plugin from "tailwindcss/plugin";

/** Raw colours. Only this file spells hex; components use the theme names below. */
export const palette = {
  temper: { 1: "#EBD697", 2: "#D9A441", 3: "#A8612B", 4: "#7A3B5D", 5: "#423A7A", 6: "#1D2F5F" },
  // 400 and 600 stand beside 500, which is for lines: as text it reaches only 4.3:1 on white.
  plate: {
    0: "#FFFFFF",
    50: "#F5F6F4",
    100: "#E9EBE7",
    200: "#D5D9D3",
    300: "#B8BEB6",
    400: "#8F978F",
    500: "#747C75",
    600: "#5C645E",
    700: "#414843",
    750: "#303833",
    800: "#252C28",
    900: "#1B211E",
  },
  quench: {
    100: "#DCEBEA",
    200: "#A6DADB",
    300: "#8CCBCD",
    600: "#1A5F64",
    700: "#12474C",
    800: "#1E3A3D",
    900: "#0B2A2D",
  },
  sound: { 100: "#E3EFE5", 300: "#8CCF9C", 600: "#2C6A3A", 800: "#1F3A27" },
  watch: { 100: "#F8ECD9", 300: "#EDB565", 600: "#8F5300", 800: "#40300F" },
  stop: { 100: "#F8E5E3", 300: "#F2A09B", 600: "#9E2A2B", 700: "#872223", 800: "#472222" },
} as const;

const { plate, quench, sound, watch, stop } = palette;

/** What each colour is for. Both themes fill the same names; tests/src/ui/contrast.test.ts checks every pair in use. */
export const themes = {
  light: {
    page: plate[50],
    surface: plate[0],
    sunken: plate[100],
    ink: plate[900],
    soft: plate[700],
    muted: plate[600],
    line: plate[200],
    "line-strong": plate[500],
    action: quench[700],
    "action-hover": quench[600],
    "action-soft": quench[100],
    "on-action": plate[0],
    sound: sound[600],
    "sound-soft": sound[100],
    watch: watch[600],
    "watch-soft": watch[100],
    stop: stop[600],
    "stop-soft": stop[100],
    danger: stop[600],
    "danger-hover": stop[700],
    "on-danger": plate[0],
    mark: plate[900],
    "mark-rim": plate[0],
    "temper-rim": "transparent",
  },
  dark: {
    page: plate[900],
    surface: plate[800],
    sunken: plate[750],
    ink: plate[50],
    soft: plate[200],
    muted: plate[300],
    line: plate[700],
    "line-strong": plate[400],
    action: quench[300],
    "action-hover": quench[200],
    "action-soft": quench[800],
    "on-action": quench[900],
    sound: sound[300],
    "sound-soft": sound[800],
    watch: watch[300],
    "watch-soft": watch[800],
    stop: stop[300],
    "stop-soft": stop[800],
    danger: stop[600],
    "danger-hover": stop[700],
    "on-danger": plate[0],
    mark: plate[900],
    "mark-rim": plate[0],
    // The blue end of the scale would sink into the dark page without an edge.
    "temper-rim": plate[400],
  },
} as const satisfies Record<"light" | "dark", Record<string, string>>;

type ThemeColour = keyof typeof themes.light;
const names = Object.keys(themes.light) as ThemeColour[];
const variables = (theme: Record<ThemeColour, string>) =>
  Object.fromEntries(names.map((name) => [`--${name}`, theme[name]]));
const themeColours = Object.fromEntries(names.map((name) => [name, `var(--${name})`]));

/** `data-theme` on <html> chooses; `system`, or none, follows the device. */
const themePlugin = plugin(({ addBase }) => {
  addBase({
    ":root": { "color-scheme": "light", ...variables(themes.light) },
    ':root[data-theme="dark"]': { "color-scheme": "dark", ...variables(themes.dark) },
    "@media (prefers-color-scheme: dark)": {
      ':root:not([data-theme="light"])': { "color-scheme": "dark", ...variables(themes.dark) },
    },
    "@media print": {
      ":root, :root[data-theme]": { "color-scheme": "light", ...variables(themes.light), "--page": plate[0] },
    },
  });
});

export default {
  content: [],
  theme: {
    colors: { transparent: "transparent", current: "currentColor", temper: palette.temper, ...themeColours },
    fontFamily: { sans: ["Lato", "system-ui", "sans-serif"] },
    fontWeight: { normal: "400", bold: "700", black: "900" },
    // 13, 15, 18, 22, 30 px at the browser's usual 16 px root; line heights on the 4 px grid.
    fontSize: {
      sm: ["0.8125rem", "1.25rem"],
      base: ["0.9375rem", "1.5rem"],
      lg: ["1.125rem", "1.5rem"],
      xl: ["1.375rem", "1.75rem"],
      "2xl": ["1.875rem", "2.25rem"],
    },
    borderRadius: { none: "0", DEFAULT: "2px", full: "9999px" },
    boxShadow: { none: "none", float: "0 4px 16px rgb(27 33 30 / 0.22)" },
    extend: {
      maxWidth: { page: "70.25rem", text: "40rem" },
      minHeight: { touch: "2.75rem" },
      minWidth: { touch: "2.75rem" },
      transitionDuration: { DEFAULT: "120ms" },
    },
  },
  plugins: [themePlugin],
} satisfies Config;
