import type { Config } from "tailwindcss";
import plugin from "tailwindcss/plugin";
import { palette } from "./src/components/theme/palette";

const variable = (name: string) => `var(--${name})`;
const verdict = (name: string) => ({ DEFAULT: variable(name), wash: variable(`${name}-wash`) });
const variables = (colours: Record<string, string>) =>
  Object.fromEntries(Object.entries(colours).map(([name, hex]) => [`--${name}`, hex]));

const over = { light: "0 6px 24px rgb(20 33 27 / .18)", dark: "0 6px 24px rgb(0 0 0 / .6)" };
const light = { ...variables(palette.light), "--over": over.light, "color-scheme": "light" };
const dark = { ...variables(palette.dark), "--over": over.dark, "color-scheme": "dark" };

/**
 * Colours are CSS variables, so a theme is a swap of values and no component says `dark:`. `data-theme` on the root is the person's own
 * choice; without one the system's preference decides. Tailwind's own colours, shadows and radii are left out on purpose.
 */
const config: Config = {
  content: ["./src/**/*.{ts,tsx}"],
  darkMode: ["selector", "[data-theme=dark]"],
  theme: {
    screens: { wide: "1240px", rail: { max: "1100px" }, phone: { max: "720px" } },
    colors: {
      transparent: "transparent",
      current: "currentColor",
      inherit: "inherit",
      ...Object.fromEntries(
        [
          ...["desk", "sheet", "tint", "field", "rule", "rule-2", "rule-3", "ink", "ink-2", "ink-3"],
          ...["tide", "tide-deep", "tide-wash", "on-tide"],
        ].map((name) => [name, variable(name)]),
      ),
      ...Object.fromEntries(["within", "near", "beyond", "open"].map((name) => [name, verdict(name)])),
      c: Object.fromEntries(["pressure", "fluid", "wall", "limit", "vent", "ghost"].map((name) => [name, variable(`c-${name}`)])),
    },
    fontFamily: {
      num: ['"Sofia Sans"', '"Ebbmark Signs"', "system-ui", "sans-serif"],
      cond: ['"Sofia Sans Semi Condensed"', '"Sofia Sans"', '"Ebbmark Signs"', "sans-serif"],
      serif: ['"STIX Two Text"', '"Ebbmark Signs"', "Georgia", "serif"],
    },
    fontSize: {
      fig: ["2.5rem", "1"],
      verdict: ["2.125rem", "1.16"],
      title: ["1.875rem", "1.15"],
      head: ["1.375rem", "1.2"],
      meaning: ["1.1875rem", "1.4"],
      sub: ["1.125rem", "1.2"],
      prose: ["1.0625rem", "1.42"],
      note: [".9375rem", "1.42"],
      body: ["1rem", "1.4"],
      value: ["1.0625rem", "1"],
      small: [".875rem", "1.4"],
      label: [".8125rem", "1.25"],
    },
    borderRadius: { none: "0", DEFAULT: "2px", full: "9999px" },
    borderWidth: { 0: "0", DEFAULT: "1px", 1: "1px", 1.5: "1.5px", 2: "2px", 3: "3px", 4: "4px" },
    boxShadow: { none: "none", over: "var(--over), 0 0 0 1px var(--rule-2)" },
    extend: {
      borderColor: { DEFAULT: "var(--rule)" },
      spacing: { line: "47px", gutter: "28px", margin: "320px", forerun: "372px", parts: "188px" },
      maxWidth: { sheet: "1680px" },
      transitionTimingFunction: { ebb: "cubic-bezier(.2,.6,.2,1)" },
    },
  },
  plugins: [
    plugin(({ addBase }) => {
      addBase({
        ":root, [data-theme=light]": light,
        "@media (prefers-color-scheme: dark)": { ":root:not([data-theme])": dark },
        "[data-theme=dark]": dark,
        // Paper has one theme, whatever the screen shows.
        "@media print": {
          ":root, :root:not([data-theme]), [data-theme]": {
            ...light,
            "--sheet": "#FFFFFF",
            "--tint": "#FFFFFF",
            "--desk": "#FFFFFF",
          },
        },
      });
    }),
  ],
};

export default config;
