/** The book's own sheet: plain enough for every reading system. */
export const STYLES = `body { font-family: "Lora", Georgia, serif; line-height: 1.5; margin: 0 5%; }
h1, h2, h3 { font-weight: 500; line-height: 1.2; page-break-after: avoid; }
h1 { font-size: 1.8em; margin: 0.6em 0 0.4em; }
h1.book { font-size: 2.6em; margin-top: 3em; }
h2 { font-size: 1.25em; margin: 1.6em 0 0.4em; }
h3 { font-size: 1em; font-style: italic; font-weight: 400; }
figure { margin: 1em 0; text-align: center; page-break-inside: avoid; }
figure.cover { margin: 0; }
img { max-width: 100%; max-height: 90vh; }
figcaption, .small, small { font-size: 0.85em; }
.hash { word-wrap: break-word; }
.subtitle { font-style: italic; font-size: 1.2em; }
.facts { border-top: 3px double; border-bottom: 1px solid; padding: 0.6em 0; }
.facts dt { font-size: 0.85em; }
.facts dd { margin: 0 0 0.4em; font-weight: 500; }
.measures td { vertical-align: baseline; padding: 0.15em 0; }
.measures .amount { text-align: right; padding-right: 1em; white-space: nowrap; font-weight: 500; }
.method li { margin-bottom: 0.8em; }
.method .small { margin: 0; }
.method div p { margin-top: 0; }
.cautions { border: 1px solid; padding: 0 1em; margin: 1.6em 0; page-break-inside: avoid; }
.contents { list-style: none; padding: 0; }
`;
