import type { Config } from "tailwindcss";

/** The tokens themselves are CSS variables in app/globals.css, so that a theme changes them in one place. */
const config: Config = {
  content: ["./app/**/*.{ts,tsx}", "./components/**/*.{ts,tsx}"],
  theme: {
    colors: {
      transparent: "transparent",
      current: "currentColor",
      ink: "var(--ink)",
      paper: "var(--paper)",
      card: "var(--card)",
      marsh: "var(--marsh)",
      foam: "var(--foam)",
      shell: "var(--shell)",
      amber: "var(--amber)",
      "on-amber": "var(--on-amber)",
      madder: "var(--madder)",
      edge: "var(--edge)",
      rule: "var(--rule)",
      quiet: "var(--quiet)",
      "on-action": "var(--on-action)",
    },
    fontFamily: { sans: ["Atkinson Hyperlegible Next", "sans-serif"] },
    screens: { narrow: "30rem", mid: "44rem", wide: "62rem" },
  },
};

export default config;
