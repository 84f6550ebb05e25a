import { useEffect } from 'react';
import { colours, focusRing, type ThemeName } from './tokens';

function pageCss(name: ThemeName): string {
  const c = colours[name];
  return `
html, body, #root { height: 100%; }
html { color-scheme: ${name === 'darkfield' ? 'dark' : 'light'}; -webkit-text-size-adjust: 100%; }
body { background: ${c.ground}; color: ${c.ink}; -webkit-font-smoothing: antialiased; }
*:focus { outline: none; }
*:focus-visible { outline: ${focusRing.width}px solid ${c.cresyl}; outline-offset: ${focusRing.offset}px; }
h1:focus-visible, [role="heading"]:focus-visible, main:focus-visible { outline: none; }
[data-framed] input:focus-visible, [data-framed] textarea:focus-visible, [data-framed] select:focus-visible { outline: none; }
[data-framed]:focus-within { outline: ${focusRing.width}px solid ${c.cresyl}; outline-offset: ${focusRing.offset}px; }
::selection { background: ${c.cresyl}; color: ${c.onCresyl}; }
input::placeholder, textarea::placeholder { color: ${c.inkSoft}; opacity: 1; }
select option { background: ${c.sheet}; color: ${c.ink}; }
tr[data-row] { position: relative; }
[data-rowlink]::after { content: ""; position: absolute; inset: 0; }
tr[data-row]:has([data-rowlink]:hover) { background: ${c.wash}; }
tr[data-row] [data-rowlink]:focus-visible { outline: none; }
tr[data-row]:has([data-rowlink]:focus-visible) { outline: ${focusRing.width}px solid ${c.cresyl}; outline-offset: -${focusRing.width}px; }
@media (prefers-reduced-motion: reduce) { *, *::before, *::after { animation-duration: 0.01ms !important; transition-duration: 0.01ms !important; scroll-behavior: auto !important; } }
@media print { [data-noprint] { display: none !important; } }
`;
}

/** Gives the page itself the theme: ground, focus ring, placeholders, reduced motion. */
export function usePageStyle(name: ThemeName): void {
  useEffect(() => {
    const sheet = new CSSStyleSheet();
    sheet.replaceSync(pageCss(name));
    // An adopted sheet needs no inline <style>, so a strict content policy lets it pass.
    document.adoptedStyleSheets = [...document.adoptedStyleSheets, sheet];
    document.documentElement.dataset.theme = name;
    return () => {
      document.adoptedStyleSheets = document.adoptedStyleSheets.filter((other) => other !== sheet);
    };
  }, [name]);
}
