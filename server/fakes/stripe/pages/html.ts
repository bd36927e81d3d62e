/** Markup that is safe to send: made only by `html`, which escapes every value that is not markup itself. */
export interface Markup {
  markup: string;
}

const ENTITIES: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;', "'": '&#39;' };

type Value = string | number | Markup | Value[] | null | undefined | false;

function render(value: Value): string {
  if (value === null || value === undefined || value === false) return '';
  if (Array.isArray(value)) return value.map(render).join('');
  if (typeof value === 'object') return value.markup;
  return String(value).replaceAll(/[&<>"']/g, (sign) => ENTITIES[sign] ?? sign);
}

export function html(parts: TemplateStringsArray, ...values: Value[]): Markup {
  return { markup: parts.map((part, i) => part + render(values[i])).join('') };
}

const STYLE = `
  :root { color-scheme: light; font: 16px/1.5 system-ui, sans-serif; color: #1b1b1f; background: #eceef1 }
  body { margin: 0 }
  .notice { margin: 0; background: #5b2a86; color: #fff; padding: .6rem 1rem; text-align: center; font-weight: 600 }
  main { max-width: 30rem; margin: 1.5rem auto; padding: 1.5rem; background: #fff; border-radius: .5rem }
  h1 { font-size: 1.3rem; margin: 0 0 1rem } h2 { font-size: 1.05rem; margin: 1.5rem 0 .5rem }
  label { display: block; margin: .8rem 0 .2rem; font-weight: 600 }
  input { width: 100%; box-sizing: border-box; padding: .55rem; border: 1px solid #6b7078; border-radius: .3rem; font: inherit }
  .pair { display: grid; grid-template-columns: 1fr 1fr; gap: 1rem }
  button { margin-top: 1.2rem; width: 100%; padding: .7rem; border: 0; border-radius: .3rem; background: #1d4f91; color: #fff; font: inherit; font-weight: 600; cursor: pointer }
  button.plain { background: #fff; color: #1d4f91; border: 1px solid #1d4f91 }
  a { color: #1d4f91 } .error { background: #fdecea; color: #8a1c12; padding: .6rem .8rem; border-radius: .3rem }
  dl { display: grid; grid-template-columns: auto 1fr; gap: .3rem 1rem; margin: 0 } dd { margin: 0; text-align: right }
  table { width: 100%; border-collapse: collapse } td, th { padding: .3rem 0; text-align: left } td:last-child, th:last-child { text-align: right }
  details { margin-top: 1.2rem } code { font-size: .95em }
`;

/** A whole page of the fake, marked as a test on every one. */
export function pageOf(title: string, body: Markup): string {
  return html`<!doctype html>
    <html lang="en-GB">
      <head>
        <meta charset="utf-8" />
        <meta name="viewport" content="width=device-width, initial-scale=1" />
        <title>${title} – payment test page</title>
        <link rel="icon" href="data:," />
        <style>
          ${{ markup: STYLE }}
        </style>
      </head>
      <body>
        <p class="notice" role="note">Payment test page: no real card is charged here.</p>
        <main>${body}</main>
      </body>
    </html>`.markup;
}

/** A day as people read it, in UTC. */
export function day(seconds: number): string {
  return new Date(seconds * 1000).toLocaleDateString('en-GB', { dateStyle: 'long', timeZone: 'UTC' });
}

export function errorNotice(message: string | null): Markup | null {
  return message === null ? null : html`<p class="error" role="alert">${message}</p>`;
}
