/** Large type, every text pair at least 7:1 in light and dark, a focus ring that shows on both. */
export const PAY_PAGE_STYLE = `
:root { --ink: #10222b; --paper: #fbfaf5; --action: #0b5446; --on-action: #ffffff; --shell: #f3e7d3; --stop: #911828; --focus: #f2b01e; }
@media (prefers-color-scheme: dark) {
  :root { --ink: #f4f1e6; --paper: #0c1a21; --action: #7fd6c0; --on-action: #0c1a21; --shell: #3a3020; --stop: #ffb3b3; --focus: #f7c04a; }
}
* { box-sizing: border-box; }
html { font-size: 112.5%; color-scheme: light dark; }
body { margin: 0; background: var(--paper); color: var(--ink); font: 400 1rem/1.6 "Atkinson Hyperlegible Next", system-ui, sans-serif; }
main { max-width: 40rem; margin: 0 auto; padding: 1.5rem; overflow-wrap: anywhere; }
h1 { font-size: 2.25rem; line-height: 1.15; margin: 1.5rem 0 1rem; }
h2 { font-size: 1.35rem; line-height: 1.2; margin: 1.5rem 0 0.5rem; }
p { margin: 0.5rem 0; }
ul { padding-left: 1.25rem; }
a { color: var(--action); text-underline-offset: 0.2em; text-decoration-thickness: 2px; display: inline-block; padding: 0.6rem 0; }
.notice { border: 2px solid var(--ink); border-left-width: 10px; background: var(--shell); padding: 0.8rem 1rem; }
.alert { border: 2px solid var(--stop); border-left-width: 10px; padding: 0.5rem 1rem; }
.total { font-size: 1.2rem; border-top: 2px solid var(--ink); padding-top: 0.5rem; }
form { margin-top: 1.5rem; }
.hint { margin: 0.35rem 0 1.4rem; }
button { min-height: 3rem; min-width: 12rem; padding: 0.65rem 1.4rem; border: 2px solid var(--action); border-radius: 4px;
  background: transparent; color: var(--action); font: inherit; font-weight: 700; cursor: pointer; }
button.first { background: var(--action); color: var(--on-action); }
:focus-visible, .alert:focus { outline: 3px solid var(--focus); outline-offset: 2px; box-shadow: 0 0 0 2px var(--ink); }
@media (forced-colors: active) { button, .alert, .notice { border-color: CanvasText; } }
`;
